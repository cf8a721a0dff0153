import type { Ref } from 'react';
import { Button } from 'react-aria-components/Button';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Select as AriaSelect, SelectValue } from 'react-aria-components/Select';
import { FieldParts, inputLook } from './field.tsx';
import type { FieldProps } from './field.tsx';

export interface SelectOption {
  readonly value: string;
  readonly label: string;
}

export interface SelectProps extends FieldProps {
  readonly name?: string;
  readonly value: string | null;
  readonly onChange: (value: string) => void;
  readonly onBlur?: () => void;
  readonly options: readonly SelectOption[];
  readonly placeholder?: string;
  readonly ref?: Ref<HTMLButtonElement>;
}

/** One of many. For up to five, radio buttons show the choice without opening anything. */
export function Select({ id, label, hint, error, value, onChange, options, placeholder = 'Choose', ref, ...rest }: SelectProps) {
  return (
    <AriaSelect
      {...rest}
      id={id}
      value={value}
      onChange={(key) => {
        if (key !== null) onChange(String(key));
      }}
      placeholder={placeholder}
      isInvalid={error !== undefined}
      validationBehavior="aria"
      className="grid max-w-xl grid-cols-1 gap-1"
    >
      <FieldParts label={label} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <Button {...(ref !== undefined && { ref })} className={`${inputLook} flex items-center justify-between gap-4 text-left`}>
          <SelectValue className="truncate data-[placeholder]:text-quiet" />
          <svg
            aria-hidden="true"
            width="12"
            height="8"
            viewBox="0 0 12 8"
            className="shrink-0"
            fill="none"
            stroke="currentColor"
            strokeWidth="1.5"
          >
            <path d="M1 1.5 6 6.5 11 1.5" />
          </svg>
        </Button>
      </FieldParts>
      <Popover className="max-h-80 min-w-(--trigger-width) overflow-auto rounded-sm border border-edge bg-sheet text-ink">
        <ListBox items={options}>
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
    </AriaSelect>
  );
}
