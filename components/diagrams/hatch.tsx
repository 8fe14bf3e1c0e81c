/** Hatching for waste and for zones to keep clear; `id` must be unique on the page. */
export function Hatch({ id, colour, pitch = 8 }: { id: string; colour: string; pitch?: number }) {
  return (
    <pattern id={id} width={pitch} height={pitch} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <line x1={0} y1={0} x2={0} y2={pitch} stroke={colour} strokeWidth={pitch / 6} />
    </pattern>
  );
}

/** Fill with a hatching. React's ids hold characters that have to be escaped there. */
export const hatched = (id: string) => `url(#${id.replace(/[^\w-]/g, '\\$&')})`;
