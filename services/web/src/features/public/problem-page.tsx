import { problems } from '@cairnstep/contract';
import type { ProblemCode } from '@cairnstep/contract';
import { useParams } from 'react-router-dom';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { explanations } from './problem-explanations.ts';

/** Where the `type` of every problem answer points. An unknown code shows the list of known ones. */
export default function ProblemPage() {
  const { code } = useParams();
  return code !== undefined && isProblemCode(code) ? <OneProblem code={code} /> : <UnknownProblem />;
}

function OneProblem({ code }: { readonly code: ProblemCode }) {
  const { title, status } = problems[code];
  const { meaning, kept, next } = explanations[code];
  return (
    <Page
      title={title}
      kicker="What a message of the registry means"
      lead={<p>{meaning}</p>}
      note={
        <p>
          For programs: <code>/problems/{code}</code>, HTTP status {status}. <TextLink to="/developers">Interface for programs</TextLink>
        </p>
      }
    >
      <Section title="What was kept" id="kept">
        <p className="max-w-2xl">{kept}</p>
      </Section>
      <Section title="What to do" id="next">
        <p className="max-w-2xl">{next}</p>
      </Section>
    </Page>
  );
}

function UnknownProblem() {
  return (
    <Page title="No message has this name" lead={<p>The registry answers with these messages. Choose one to read what it means.</p>}>
      <Section>
        <ul className="grid gap-1">
          {Object.entries(problems).map(([code, { title }]) => (
            <li key={code}>
              <TextLink to={`/problems/${code}`}>{title}</TextLink>
            </li>
          ))}
        </ul>
      </Section>
    </Page>
  );
}

function isProblemCode(code: string): code is ProblemCode {
  return Object.hasOwn(problems, code);
}
