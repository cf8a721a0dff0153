/** One of very many: typing narrows the list down. For a few dozen at the most, `Select` shows them all. */
import { useMemo, useState } from 'react';
import { Button } from 'react-aria-components/Button';
import { ComboBox as AriaComboBox } from 'react-aria-components/ComboBox';
import { Group } from 'react-aria-components/Group';
import { Input } from 'react-aria-components/Input';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { foldText, wordMatcher } from '../lib/word-match.ts';
import { FieldParts, inputLook } from './field.tsx';
import type { FieldProps } from './field.tsx';

export interface ComboOption {
  readonly value: string;
  readonly label: string;
  /** Other words it can be found by. */
  readonly words?: string;
}

export interface ComboBoxProps extends FieldProps {
  readonly value: string | null;
  readonly onChange: (value: string) => void;
  readonly options: readonly ComboOption[];
  readonly autoFocus?: boolean;
}

export function ComboBox({ label, hint, error, value, onChange, options, ...rest }: ComboBoxProps) {
  const chosen = options.find((option) => option.value === value)?.label ?? '';
  const [typed, setTyped] = useState(chosen);
  const folded = useMemo(() => options.map((option) => ({ option, text: foldText(`${option.label} ${option.words ?? ''}`) })), [options]);
  const shown = useMemo(() => {
    if (typed === chosen) return options;
    const matches = wordMatcher(typed);
    return folded.filter(({ text }) => matches(text)).map(({ option }) => option);
  }, [typed, chosen, options, folded]);

  return (
    <AriaComboBox
      {...rest}
      items={shown}
      inputValue={typed}
      onInputChange={setTyped}
      selectedKey={value}
      onSelectionChange={(key) => {
        const option = options.find((each) => each.value === key);
        setTyped(option?.label ?? chosen);
        if (option !== undefined && option.value !== value) onChange(option.value);
      }}
      allowsEmptyCollection
      menuTrigger="input"
      isInvalid={error !== undefined}
      validationBehavior="aria"
      className="grid max-w-xl grid-cols-1 gap-1"
    >
      <FieldParts label={label} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <Group className="relative">
          <Input className={`${inputLook} pr-11`} />
          <Button className="absolute inset-y-0 right-0 grid w-10 place-items-center">
            <svg aria-hidden="true" width="12" height="8" viewBox="0 0 12 8" fill="none" stroke="currentColor" strokeWidth="1.5">
              <path d="M1 1.5 6 6.5 11 1.5" />
            </svg>
          </Button>
        </Group>
      </FieldParts>
      <Popover className="max-h-80 w-(--trigger-width) overflow-auto rounded-sm border border-edge bg-sheet text-ink">
        <ListBox<ComboOption> renderEmptyState={() => <p className="px-3 py-2 text-quiet">Nothing is called like this.</p>}>
          {(option) => (
            <ListBoxItem
              id={option.value}
              textValue={option.label}
              className="min-h-10 cursor-pointer border-l-4 border-transparent px-3 py-2 outline-none data-[focused]:bg-paper data-[focus-visible]:outline-2 data-[focus-visible]:-outline-offset-2 data-[focus-visible]:outline-lake data-[selected]:border-lichen data-[selected]:bg-chosen data-[selected]:font-semibold"
            >
              {option.label}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </AriaComboBox>
  );
}
