import type { FormattedLength } from '@/lib/domain/measure';

/** Sizes side by side, "43 ½ × 2 ¼ × ¾": true fractions, the unit said once where it is not inches. */
export function SizeText({ sizes, className = '' }: { sizes: readonly FormattedLength[]; className?: string }) {
  const unit = sizes[0]?.parts.unit;
  return (
    <span className={`figures ${className}`}>
      <span className="sr-only">{sizes.map(({ text }) => text).join(' by ')}</span>
      <span aria-hidden="true">
        {sizes.map((size, index) => (
          <span key={index} className="whitespace-nowrap">
            {index > 0 && <span className="px-[0.18em]">×</span>}
            <Figure size={size} />
          </span>
        ))}
        {unit && unit !== '″' && ` ${unit}`}
      </span>
    </span>
  );
}

function Figure({ size }: { size: FormattedLength }) {
  const { parts } = size;
  const minus = parts.sign < 0 ? '−' : '';
  if (parts.numerator === undefined) {
    const feet = parts.feet === undefined ? '' : `${parts.feet}′ `;
    return (
      <>{`${minus}${feet}${parts.whole}${parts.decimals && Number(parts.decimals) > 0 ? `.${parts.decimals}` : ''}`}</>
    );
  }
  return (
    <>
      {minus}
      {parts.feet !== undefined && `${parts.feet}′ `}
      {(parts.whole !== 0 || parts.feet !== undefined) && <span className="pr-[0.14em]">{parts.whole}</span>}
      <span className="fraction">
        {parts.numerator}/{parts.denominator}
      </span>
    </>
  );
}
