import type { ReactNode } from 'react';

interface FormPageProps {
  title: string;
  /** The form. */
  children: ReactNode;
  /** What else one may have come for, under a line. */
  otherwise?: ReactNode;
}

/** A page that is there for one form. */
export function FormPage({ title, children, otherwise }: FormPageProps) {
  return (
    <div className="mx-auto grid max-w-md gap-6">
      <h1 className="text-4xl">{title}</h1>
      {children}
      {otherwise && <div className="flex flex-wrap gap-x-6 border-t border-line pt-3">{otherwise}</div>}
    </div>
  );
}
