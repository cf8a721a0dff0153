import { useId } from 'react';

export interface NumberedChoiceProps {
  readonly legend: string;
  readonly name: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly value: string | null;
  readonly onChange: (value: string) => void;
}

/** One of at most ten, each with the digit that chooses it: 1 to 9, then 0. */
export function NumberedChoice({ legend, name, options, value, onChange }: NumberedChoiceProps) {
  const group = useId();
  return (
    <fieldset data-choice={name}>
      <legend className="font-semibold">{legend}</legend>
      <div className="grid gap-x-6 sm:grid-cols-2">
        {options.map((option, index) => (
          <label key={option.value} className="flex min-h-7 cursor-pointer items-start gap-2">
            <input
              type="radio"
              name={group}
              value={option.value}
              checked={value === option.value}
              onChange={() => onChange(option.value)}
              className="mt-1 size-4 shrink-0 accent-lichen"
            />
            <kbd className="numbers w-4 shrink-0 font-semibold text-quiet">{digitOf(index)}</kbd>
            <span>{option.label}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

const digitOf = (index: number): string => String((index + 1) % 10);

/** The option that a digit chooses. */
export function optionOfDigit<Option>(options: readonly Option[], digit: string): Option | undefined {
  return options.find((_, index) => digitOf(index) === digit);
}
