import type { AccountDatabase } from '../database';
import type { EmergencyCard } from '../rows';
import { durably, type NotSaved } from '../saved';

/** Keeps the emergency card on this phone. */
export function saveEmergencyCard(db: AccountDatabase, card: EmergencyCard): Promise<void | NotSaved> {
  return durably(db, () =>
    db.transaction('rw', db.facts, async () => {
      await db.facts.put({ key: 'emergencyCard', value: card });
    }),
  );
}
