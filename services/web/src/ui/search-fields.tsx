/** Words to search for and one choice beside them: how a long list is looked through. */
import { Select } from './select.tsx';
import type { SelectProps } from './select.tsx';
import { TextField } from './text-field.tsx';

export interface SearchFieldsProps {
  /** Begins the ids of both fields. */
  readonly id: string;
  /** Where the words are looked for. */
  readonly hint: string;
  readonly words: string;
  readonly onWords: (words: string) => void;
  readonly choice: Pick<SelectProps, 'label' | 'hint' | 'value' | 'options' | 'onChange'>;
}

export function SearchFields({ id, hint, words, onWords, choice }: SearchFieldsProps) {
  return (
    <div role="search" className="not-printed grid max-w-2xl gap-4 sm:grid-cols-2">
      <TextField
        id={`${id}-search`}
        label="Search"
        hint={hint}
        type="search"
        value={words}
        onChange={onWords}
        autoComplete="off"
        spellCheck="false"
      />
      <Select id={`${id}-choice`} {...choice} />
    </div>
  );
}
