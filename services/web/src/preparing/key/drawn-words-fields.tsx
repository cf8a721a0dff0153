import type { PlacedProblem } from '../../lib/field-problems.ts';
import { Button } from '../../ui/button.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { TextField } from '../../ui/text-field.tsx';
import type { DrawnWords } from './use-drawn-words.ts';

export interface DrawnWordsFieldsProps {
  readonly drawn: DrawnWords;
  readonly problems: readonly PlacedProblem[];
}

/** Six words to write down, and two of them to type from the paper. */
export function DrawnWordsFields({ drawn, problems }: DrawnWordsFieldsProps) {
  const errorAt = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;
  return (
    <div className="grid max-w-2xl gap-3">
      <p>Six words, drawn for you. Write them on paper and keep the paper at your site, apart from the file. Nobody can recover them.</p>
      <ol className="grid list-inside list-decimal grid-cols-2 gap-x-6 gap-y-1 rounded-sm border border-edge bg-paper p-4 font-mono sm:grid-cols-3">
        {drawn.words.map((word, at) => (
          <li key={at}>{word}</li>
        ))}
      </ol>
      <div>
        <Button onPress={drawn.drawOthers}>Other words</Button>
      </div>
      <Checkbox id={drawn.writtenId} value={drawn.isWritten} onChange={drawn.sayWritten} error={errorAt(drawn.writtenId)} isRequired>
        I have written these six words down
      </Checkbox>
      {drawn.askedBack.map(({ fieldId, number, typed, type }) => (
        <TextField
          key={fieldId}
          id={fieldId}
          label={`Word ${number}, from your paper`}
          autoComplete="off"
          spellCheck="false"
          value={typed}
          onChange={type}
          error={errorAt(fieldId)}
          isRequired
        />
      ))}
    </div>
  );
}
