import Renderer, { type Components } from 'react-markdown';
import { withTrueFractions } from './true-fractions';

const components: Components = {
  p: ({ children }) => <p>{withTrueFractions(children)}</p>,
  li: ({ children }) => <li>{withTrueFractions(children)}</li>,
  strong: ({ children }) => <strong>{withTrueFractions(children)}</strong>,
  em: ({ children }) => <em>{withTrueFractions(children)}</em>,
};

/** Markdown of a plan as elements; raw HTML in it stays text. */
export function PlanMarkdown({ children }: { children: string }) {
  return (
    <Renderer components={components} disallowedElements={['img']} unwrapDisallowed>
      {children}
    </Renderer>
  );
}
