import type { ReactNode } from 'react';
import { Radio, RadioGroup as AriaRadioGroup } from 'react-aria-components/RadioGroup';
import { FieldParts } from './field.tsx';
import type { FieldProps } from './field.tsx';

export interface RadioOption {
  readonly value: string;
  readonly label: ReactNode;
  readonly hint?: ReactNode;
}

export interface RadioGroupProps extends FieldProps {
  readonly name?: string;
  readonly value: string | null;
  readonly onChange: (value: string) => void;
  readonly onBlur?: () => void;
  readonly options: readonly RadioOption[];
  /** Side by side where there is room. */
  readonly inline?: boolean;
}

/** One of a few, all in sight. */
export function RadioGroup({ label, hint, error, options, inline = false, ...rest }: RadioGroupProps) {
  return (
    <AriaRadioGroup {...rest} isInvalid={error !== undefined} validationBehavior="aria" className="grid max-w-xl gap-1">
      <FieldParts label={label} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <div className={inline ? 'flex flex-wrap gap-x-6' : 'grid'}>
          {options.map((option) => (
            <Radio key={option.value} value={option.value} className="group flex min-h-10 cursor-pointer items-start gap-3 py-2">
              <span
                aria-hidden="true"
                className="mt-0.5 grid size-5 shrink-0 place-items-center rounded-full border border-edge bg-sheet group-data-[focus-visible]:outline-2 group-data-[focus-visible]:outline-offset-2 group-data-[focus-visible]:outline-lake group-data-[invalid]:border-oxide group-data-[selected]:border-lichen"
              >
                <span className="size-2.5 rounded-full group-data-[selected]:bg-lichen" />
              </span>
              <span>
                {option.label}
                {option.hint !== undefined && <span className="block text-small text-quiet">{option.hint}</span>}
              </span>
            </Radio>
          ))}
        </div>
      </FieldParts>
    </AriaRadioGroup>
  );
}
