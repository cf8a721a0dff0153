import { TextLink } from '../ui/text-link.tsx';

/** What every screen says about the use of what it shows. */
export function Cautions() {
  return (
    <div className="grid gap-4 md:grid-cols-[1fr_auto] md:gap-10">
      <div className="grid max-w-3xl gap-2">
        <p>
          Group statistics describe groups. They do not choose or dose treatment for one person; that stays with licensed clinicians, the
          device’s own instructions and local protocols.
        </p>
        <p>
          Autonomic dysreflexia, a fall with injury, a fracture or skin breakdown: follow the clinic’s emergency and reporting protocol
          first, the registry second.
        </p>
        <p>Re-identification of participants is forbidden by every access agreement.</p>
      </div>
      <ul className="grid content-start gap-1">
        <li>
          <TextLink to="/participants">For participants</TextLink>
        </li>
        <li>
          <TextLink to="/developers">Interface for programs</TextLink>
        </li>
      </ul>
    </div>
  );
}
