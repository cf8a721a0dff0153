import { methodPages } from '@cairnstep/statistics';
import { useParams } from 'react-router-dom';
import { LinkButton } from '../../ui/button.tsx';
import { Page } from '../../ui/page.tsx';
import { DecisionEntry } from './decision-entry.tsx';
import { decisions } from './decisions.ts';
import { MethodEntry } from './method-entry.tsx';

export default function MethodPage() {
  const { slug } = useParams();
  const method = methodPages.find((known) => known.slug === slug);
  if (method !== undefined) return <MethodEntry method={method} />;
  const decision = decisions.find((known) => known.slug === slug);
  return decision === undefined ? <NothingHere /> : <DecisionEntry decision={decision} />;
}

function NothingHere() {
  return (
    <Page
      title="No method has this address"
      lead={<p>The address may be mistyped. Look for the method by its name, or by the question it answers.</p>}
      actions={<LinkButton to="/methods">To the methods</LinkButton>}
    />
  );
}
