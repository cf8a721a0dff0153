import { openReadings } from '@cairnstep/scoring';
import { memo } from 'react';
import { Section } from '../../ui/page.tsx';
import { keyWords } from './keys.ts';

/** The keys, and what is done where the standard can be read in more than one way. */
export const Explanations = memo(function Explanations() {
  return (
    <div className="not-printed">
      <Section title="Keys" id="keys" note={<p>They work while a cell of the sheet has the focus. Tab goes in and out of the sheet.</p>}>
        <dl className="grid max-w-2xl">
          {keyWords.map(({ keys, does }) => (
            <div key={keys} className="grid grid-cols-[7rem_minmax(0,1fr)] border-b border-hairline py-1">
              <dt>
                <kbd className="font-semibold">{keys}</kbd>
              </dt>
              <dd>{does}</dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section
        title="Where the standard leaves a choice"
        id="readings"
        note={
          <>
            <p>A star behind a result says that starred cells change it.</p>
            <p>ND: not determinable from this exam. Every value it can have stands with it.</p>
          </>
        }
      >
        <dl className="grid max-w-2xl gap-4">
          {openReadings.map(({ question, choice, why }) => (
            <div key={question}>
              <dt className="font-semibold">{question}</dt>
              <dd>{choice}</dd>
              <dd className="text-small text-quiet">{why}</dd>
            </div>
          ))}
        </dl>
      </Section>
    </div>
  );
});
