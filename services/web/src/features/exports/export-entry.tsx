import type { DataExport } from '@cairnstep/contract';
import { downloadExport } from '@cairnstep/contract';
import type { ReactNode } from 'react';
import { useBuildExport } from '../../lib/build-export.ts';
import { addressOf } from '../../lib/call.ts';
import { formatBytes, formatCount, formatDate, formatInstant } from '../../lib/format.ts';
import { AddressButton, Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Notice } from '../../ui/notice.tsx';
import { TextLink } from '../../ui/text-link.tsx';

export function ExportEntry({ built }: { readonly built: DataExport }) {
  const { id, number, requestId, requestTitle, status, builtAt, participants, bytes, sha256, accessEndsOn } = built;
  const titleId = `export-${id}`;
  return (
    <li aria-labelledby={titleId} className="grid gap-3 py-6">
      <h2 id={titleId} className="text-section font-semibold">
        {number}: {requestTitle}
      </h2>
      <State built={built} />
      <dl className="grid gap-x-6 gap-y-2 sm:grid-cols-2 md:grid-cols-4">
        {builtAt !== null && <Fact label="Built">{formatInstant(builtAt)}</Fact>}
        {participants !== null && <Fact label="Holds">{formatCount(participants, 'person', 'people')}</Fact>}
        {bytes !== null && <Fact label="Size">{formatBytes(bytes)}</Fact>}
        <Fact label="Access ends">{formatDate(accessEndsOn)}</Fact>
      </dl>
      {sha256 !== null && (
        <p className="text-small text-quiet">
          SHA-256 <code className="font-mono break-all text-ink">{sha256}</code>
        </p>
      )}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        {status === 'ready' && !hasEnded(built) && (
          <AddressButton variant="primary" href={addressOf(downloadExport, { exportId: id })}>
            Download {number}.zip
          </AddressButton>
        )}
        {(status === 'stale' || status === 'failed') && !hasEnded(built) && <BuildAgain requestId={requestId} />}
        <TextLink to={`/requests/${requestId}`}>The request</TextLink>
      </div>
    </li>
  );
}

/** Days count in UTC, as at the registry. */
const hasEnded = ({ accessEndsOn }: DataExport): boolean => accessEndsOn < new Date().toISOString().slice(0, 10);

function State({ built }: { readonly built: DataExport }) {
  if (hasEnded(built)) {
    return (
      <Notice kind="warning" title="Access has ended.">
        <p>Destroy every copy. A new request can be written.</p>
      </Notice>
    );
  }
  switch (built.status) {
    case 'building':
      return (
        <p role="status" className="font-semibold">
          Being built. You can leave this page; an e-mail tells the lead when it is ready.
        </p>
      );
    case 'ready':
      return null;
    case 'failed':
      return (
        <Notice kind="error" title="It could not be built.">
          <p>
            Nothing of it was kept. Either too few people consent to protect each of them, or the request is no longer approved. Build it
            again; if it fails again, ask the registry office.
          </p>
        </Notice>
      );
    case 'stale':
      return (
        <Notice kind="warning" title="Somebody in it has withdrawn consent.">
          <p>It cannot be downloaded any more. Destroy every copy you have, and build it again without them.</p>
        </Notice>
      );
  }
}

function BuildAgain({ requestId }: { readonly requestId: string }) {
  const build = useBuildExport();
  return (
    <>
      <Button variant="primary" isPending={build.isPending} onPress={() => build.mutate(requestId)}>
        Build it again
      </Button>
      {build.isError && (
        <div className="basis-full">
          <ErrorNotice error={build.error} />
        </div>
      )}
    </>
  );
}

function Fact({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <div>
      <dt className="text-small text-quiet">{label}</dt>
      <dd className="numbers">{children}</dd>
    </div>
  );
}
