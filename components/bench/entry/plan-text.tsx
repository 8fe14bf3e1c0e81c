'use client';
import dynamic from 'next/dynamic';
import { createContext, useContext } from 'react';

const PlainText = createContext('');

/** Words of a plan (Markdown). The renderer comes after the first paint; until then the words stand as they were written. */
export function PlanText({ text, className = '' }: { text: string; className?: string }) {
  return (
    <div className={`plan-text ${className}`}>
      <PlainText.Provider value={text}>
        <Markdown>{text}</Markdown>
      </PlainText.Provider>
    </div>
  );
}

function Plain() {
  return <p className="whitespace-pre-line">{useContext(PlainText)}</p>;
}

// Pictures in a plan are attachments, kept in the pack and shown as drawings; an address in its words is not fetched.
const Markdown = dynamic(() => import('./plan-markdown').then((m) => m.PlanMarkdown), { loading: Plain });
