import type { ReactNode, Ref } from 'react';
import { Checkbox as AriaCheckbox } from 'react-aria-components/Checkbox';

export interface CheckboxProps {
  readonly id: string;
  readonly name?: string;
  /** The whole statement that a tick makes. */
  readonly children: ReactNode;
  readonly value: boolean;
  readonly onChange: (value: boolean) => void;
  readonly onBlur?: () => void;
  readonly error?: string | undefined;
  readonly isRequired?: boolean;
  readonly isDisabled?: boolean;
  readonly ref?: Ref<HTMLInputElement>;
}

export function Checkbox({ id, children, value, onChange, error, isRequired = false, ref, ...rest }: CheckboxProps) {
  const errorId = `${id}-error`;
  return (
    <div className="grid max-w-xl gap-1">
      {error !== undefined && (
        <span id={errorId} className="block border-l-4 border-oxide pl-2 font-semibold text-oxide">
          {error}
        </span>
      )}
      <AriaCheckbox
        {...rest}
        {...(ref !== undefined && { inputRef: ref })}
        {...(error !== undefined && { 'aria-describedby': errorId })}
        id={id}
        isSelected={value}
        onChange={onChange}
        isRequired={isRequired}
        isInvalid={error !== undefined}
        validationBehavior="aria"
        className="group flex min-h-10 cursor-pointer items-start gap-3 py-2 data-[disabled]:cursor-default data-[disabled]:text-quiet"
      >
        <span
          aria-hidden="true"
          className="mt-0.5 grid size-5 shrink-0 place-items-center rounded-sm border border-edge bg-sheet text-sheet group-data-[focus-visible]:outline-2 group-data-[focus-visible]:outline-offset-2 group-data-[focus-visible]:outline-lake group-data-[invalid]:border-oxide group-data-[selected]:border-lichen group-data-[selected]:bg-lichen"
        >
          <svg
            width="12"
            height="10"
            viewBox="0 0 12 10"
            fill="none"
            stroke="currentColor"
            strokeWidth="2"
            className="hidden group-data-[selected]:block"
          >
            <path d="M1 5 4.5 8.5 11 1.5" />
          </svg>
        </span>
        <span>
          {children}
          {isRequired && <span className="text-quiet"> (required)</span>}
        </span>
      </AriaCheckbox>
    </div>
  );
}
