import { cloneElement, useId, type AriaAttributes, type ReactElement } from 'react';

interface FieldControlProps extends AriaAttributes {
  id?: string;
  className?: string;
}

interface FieldProps {
  /** Always visible, above the control. */
  label: string;
  /** What to put in, in a few words, under the control. */
  hint?: string;
  /** What is wrong and what to do. */
  error?: string;
  /** One input, select or textarea; gets its id, description and look here. */
  children: ReactElement<FieldControlProps>;
}

export const controlLook =
  'min-h-[52px] w-full rounded-plate border-2 border-iron bg-paper px-3 py-2 text-lg text-iron aria-invalid:border-red';

/** Label, control, hint and error, wired once so that no form does it by hand. */
export function Field({ label, hint, error, children }: FieldProps) {
  const id = useId();
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <div className="grid gap-1.5">
      <label htmlFor={id} className="font-figures text-lg font-semibold">
        {label}
      </label>
      {cloneElement(children, {
        id,
        'aria-describedby': described || undefined,
        'aria-invalid': error ? true : undefined,
        className: `${controlLook} ${children.props.className ?? ''}`,
      })}
      {hint && (
        <p id={`${id}-hint`} className="text-base text-soft">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="text-base font-semibold text-red">
          {error}
        </p>
      )}
    </div>
  );
}
