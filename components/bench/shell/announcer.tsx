'use client';
import { createContext, useCallback, useContext, useState, type ReactNode } from 'react';

const AnnounceContext = createContext<(words: string) => void>(() => {
  throw new Error('useAnnounce is used outside <Announcer>');
});

/** One live region for the whole bench: results of acts are said aloud, since hands and eyes may be on the work. */
export function Announcer({ children }: { children: ReactNode }) {
  const [said, setSaid] = useState({ words: '', times: 0 });
  const announce = useCallback((words: string) => setSaid(({ times }) => ({ words, times: times + 1 })), []);
  return (
    <AnnounceContext.Provider value={announce}>
      {children}
      {/* A no-break space now and then makes a repeated sentence a new one, so that it is read again. */}
      <p role="status" className="sr-only">
        {said.words}
        {said.times % 2 === 1 ? '\u00a0' : ''}
      </p>
    </AnnounceContext.Provider>
  );
}

export const useAnnounce = () => useContext(AnnounceContext);
