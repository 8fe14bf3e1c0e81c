import type { FormattedLength } from '@/lib/domain/measure';

/** A length as a person reads it: feet and inches with prime marks, a true fraction set as one glyph run. */
export function LengthText({ value, className = '' }: { value: FormattedLength; className?: string }) {
  const { parts } = value;
  const fraction = parts.numerator !== undefined && parts.denominator !== undefined;
  return (
    <span className={`figures whitespace-nowrap ${className}`}>
      <span className="sr-only">{value.text}</span>
      <span aria-hidden="true">
        {fraction ? (
          <>
            {parts.sign < 0 && '−'}
            {parts.feet !== undefined && `${parts.feet}′ `}
            {(parts.whole !== 0 || parts.feet !== undefined) && `${parts.whole}\u202f`}
            <span className="fraction">
              {parts.numerator}/{parts.denominator}
            </span>
            ″
          </>
        ) : (
          value.text
        )}
      </span>
    </span>
  );
}
