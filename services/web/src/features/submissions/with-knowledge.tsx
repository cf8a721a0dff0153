import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Answer } from '../../ui/answer.tsx';
import { Section } from '../../ui/page.tsx';
import { siteKnowledgeQuery } from './preparing.queries.ts';
import type { SiteKnowledge } from './preparing.queries.ts';

export interface WithKnowledgeProps {
  readonly siteId: string;
  readonly children: (knowledge: SiteKnowledge) => ReactNode;
}

/** What the preparing page has to know of a site, before it is opened. */
export function WithKnowledge({ siteId, children }: WithKnowledgeProps) {
  const query = useQuery(siteKnowledgeQuery(siteId));
  if (query.data !== undefined) return children(query.data);
  return (
    <Section>
      <Answer query={query} waiting="Reading which codes the registry holds of the site.">
        {() => null}
      </Answer>
    </Section>
  );
}
