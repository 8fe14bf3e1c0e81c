import { beforeEach, vi } from 'vitest';
import type { AddressedLetter } from '@/lib/server/mail/compose-letter';
import type { LetterOrder } from '@/lib/server/mail/letter-order';

const orders = vi.hoisted((): LetterOrder[] => []);

vi.mock('@/lib/server/jobs/queue', () => ({
  orderLetter: async (order: LetterOrder) => void orders.push(order),
}));

/**
 * Letters that this test file orders, in place of the queue. They are written when asked for, as the queue's worker would.
 * Import this before what is under test.
 */
export function useOrderedLetters() {
  beforeEach(() => void (orders.length = 0));
  return {
    orders,
    /** Writes every letter ordered since last time. */
    async write(): Promise<AddressedLetter[]> {
      const { composeLetter } = await import('@/lib/server/mail/compose-letter');
      const { letterOrder } = await import('@/lib/server/mail/letter-order');
      const written: AddressedLetter[] = [];
      for (const order of orders.splice(0)) {
        const letter = await composeLetter(letterOrder.parse(order));
        if (letter) written.push(letter);
      }
      return written;
    },
  };
}
