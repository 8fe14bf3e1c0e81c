import { z } from 'zod';
import { planDocumentSchema } from '@/lib/domain/plan/document';

export interface SchemaNode {
  $ref?: string;
  $defs?: Record<string, SchemaNode>;
  type?: string;
  description?: string;
  properties?: Record<string, SchemaNode>;
  required?: string[];
  items?: SchemaNode | boolean;
  prefixItems?: SchemaNode[];
  anyOf?: SchemaNode[];
  oneOf?: SchemaNode[];
  enum?: unknown[];
  const?: unknown;
  default?: unknown;
  pattern?: string;
  format?: string;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: number;
  minItems?: number;
  maxItems?: number;
  minLength?: number;
  maxLength?: number;
}

/** JSON Schema (draft 2020-12) of a plan file as an author writes it: fields with a default may be left out. */
export function planSchema(): SchemaNode {
  const schema = z.toJSONSchema(planDocumentSchema, { io: 'input' });
  return {
    ...(schema as SchemaNode),
    description:
      'Holdfast plan document, version 1. References between records, circles and formulas are checked by the reader as well.',
  };
}
