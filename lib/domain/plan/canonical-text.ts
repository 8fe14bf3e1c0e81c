import canonicalize from 'canonicalize';
import type { PlanDocument } from './document';

/**
 * Text of a plan in the canonical form of RFC 8785, the same for the same plan whatever the order of its fields. Its
 * SHA-256 is the content hash that names a revision. Attachments count by their own hash: their bytes are left out.
 */
export function canonicalText(plan: PlanDocument): string {
  const attachments = plan.attachments.map(({ content: _content, ...facts }) => facts);
  return canonicalize({ ...plan, attachments })!;
}
