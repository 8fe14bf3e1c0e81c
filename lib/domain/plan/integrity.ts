import type { PlanDocument } from './document';
import { evaluateSize, resolveKeySizes } from './key-sizes';
import type { PlanProblem } from './plan-problem';
import { stepOrder } from './step-order';

/** Everything in a plan that refers to something that is not there, clashes, or goes round in a circle. */
export function checkIntegrity(plan: PlanDocument): PlanProblem[] {
  const check = new Check(plan);
  check.uniqueIds();
  check.references();
  check.partRules();
  check.order();
  check.sizes();
  return check.problems;
}

class Check {
  readonly problems: PlanProblem[] = [];
  private readonly ids: Record<'stage' | 'step' | 'part' | 'stock' | 'keySize' | 'adhesive' | 'item', Set<string>>;

  constructor(private readonly plan: PlanDocument) {
    const ids = (rows: { id: string }[]) => new Set(rows.map(({ id }) => id));
    this.ids = {
      stage: ids(plan.stages),
      step: ids(plan.steps),
      part: ids(plan.parts),
      stock: ids(plan.stock),
      keySize: ids(plan.keySizes),
      adhesive: ids(plan.adhesives),
      item: ids([...plan.hardware, ...plan.supplies]),
    };
  }

  private say(path: string, expected: string, message: string): void {
    this.problems.push({ path, expected, message });
  }

  private known(kind: keyof Check['ids'], id: string, path: string): void {
    const names = {
      stage: 'stage',
      step: 'step',
      part: 'part',
      stock: 'stock',
      keySize: 'key size',
      adhesive: 'adhesive',
      item: 'hardware or supply',
    };
    if (!this.ids[kind].has(id))
      this.say(path, `the id of a ${names[kind]} of this plan`, `There is no ${names[kind]} "${id}".`);
  }

  private unique(rows: readonly { id: string }[], path: string, seen = new Set<string>()): Set<string> {
    rows.forEach(({ id }, i) => {
      if (seen.has(id)) this.say(`${path}[${i}].id`, 'an id used once', `"${id}" is used twice.`);
      seen.add(id);
    });
    return seen;
  }

  uniqueIds(): void {
    const { plan } = this;
    for (const name of [
      'stages',
      'keySizes',
      'stock',
      'parts',
      'adhesives',
      'steps',
      'faces',
      'attachments',
    ] as const) {
      this.unique(plan[name], name);
    }
    this.unique(plan.supplies, 'supplies', this.unique(plan.hardware, 'hardware'));
    const labels = new Set<string>();
    plan.parts.forEach(({ label }, i) => {
      if (labels.has(label)) this.say(`parts[${i}].label`, 'a label used once', `Two parts are labelled ${label}.`);
      labels.add(label);
    });
    const [checks, photos, glueUps, coats] = [
      new Set<string>(),
      new Set<string>(),
      new Set<string>(),
      new Set<string>(),
    ];
    plan.steps.forEach((step, i) => {
      this.unique(step.methods, `steps[${i}].methods`);
      this.unique(step.checks, `steps[${i}].checks`, checks);
      this.unique(step.photosWanted, `steps[${i}].photosWanted`, photos);
      if (step.glueUp) this.unique([step.glueUp], `steps[${i}].glueUp`, glueUps);
      if (step.finish) this.unique([step.finish], `steps[${i}].finish`, coats);
    });
    plan.faces.forEach((face, i) => {
      this.unique(face.fasteners, `faces[${i}].fasteners`);
      this.unique(face.cuts, `faces[${i}].cuts`);
    });
  }

  references(): void {
    const { plan } = this;
    plan.keySizes.forEach(({ takeFromWork }, i) => {
      if (!takeFromWork) return;
      this.known('step', takeFromWork.step, `keySizes[${i}].takeFromWork.step`);
      if (takeFromWork.stock) this.known('stock', takeFromWork.stock, `keySizes[${i}].takeFromWork.stock`);
    });
    plan.parts.forEach((part, i) => {
      this.known('stock', part.stock, `parts[${i}].stock`);
      part.madeFrom?.forEach((id, j) => this.known('part', id, `parts[${i}].madeFrom[${j}]`));
    });
    plan.steps.forEach((step, i) => {
      const path = `steps[${i}]`;
      this.known('stage', step.stage, `${path}.stage`);
      step.after.forEach((after, j) => {
        if (typeof after === 'string') this.known('step', after, `${path}.after[${j}]`);
        else this.known('step', after.step, `${path}.after[${j}].step`);
      });
      step.uses.forEach(({ part }, j) => this.known('part', part, `${path}.uses[${j}].part`));
      step.makes.forEach((part, j) => this.known('part', part, `${path}.makes[${j}]`));
      step.takes.forEach(({ item }, j) => this.known('item', item, `${path}.takes[${j}].item`));
      if (step.glueUp) this.known('adhesive', step.glueUp.adhesive, `${path}.glueUp.adhesive`);
      if (step.finish) this.known('item', step.finish.product, `${path}.finish.product`);
    });
    plan.faces.forEach((face, i) => {
      if (face.part) this.known('part', face.part, `faces[${i}].part`);
      face.fasteners.forEach((fastener, j) => {
        this.known('step', fastener.step, `faces[${i}].fasteners[${j}].step`);
        if (fastener.removedIn) this.known('step', fastener.removedIn, `faces[${i}].fasteners[${j}].removedIn`);
      });
      face.cuts.forEach((cut, j) => this.known('step', cut.step, `faces[${i}].cuts[${j}].step`));
    });
    plan.attachments.forEach((file, i) =>
      file.steps.forEach((step, j) => this.known('step', step, `attachments[${i}].steps[${j}]`)),
    );
  }

  partRules(): void {
    const { plan } = this;
    plan.parts.forEach((part, i) => {
      if (part.hand === 'pair' && part.quantity % 2 === 1) {
        this.say(
          `parts[${i}].quantity`,
          'an even quantity, half left and half right',
          `${part.quantity} pieces cannot be pairs.`,
        );
      }
      if (part.madeFrom?.includes(part.id))
        this.say(`parts[${i}].madeFrom`, 'other parts', 'A part cannot be made from itself.');
    });
    const placed = new Set<string>();
    plan.placements.forEach(({ part, piece }, i) => {
      const found = plan.parts.find(({ id }) => id === part);
      if (!found) this.known('part', part, `placements[${i}].part`);
      else if (piece > found.quantity) {
        this.say(
          `placements[${i}].piece`,
          `a piece from 1 to ${found.quantity}`,
          `Part ${found.label} has no piece ${piece}.`,
        );
      }
      if (placed.has(`${part}#${piece}`))
        this.say(`placements[${i}]`, 'each piece in one place', `Piece ${piece} of "${part}" is placed twice.`);
      placed.add(`${part}#${piece}`);
    });
  }

  order(): void {
    const { plan } = this;
    const order = stepOrder(plan.steps);
    if (!order.ok) {
      const at = plan.steps.findIndex(({ id }) => id === order.circle[0]);
      this.say(
        `steps[${at}].after`,
        'an order without circles',
        `These steps wait for one another: ${order.circle.join(', ')}.`,
      );
      return;
    }
    plan.steps.forEach((step, i) => {
      step.after.forEach((after, j) => {
        if (typeof after === 'string' || !after.glue) return;
        const before = plan.steps.find(({ id }) => id === after.step);
        if (before && !before.glueUp) {
          this.say(`steps[${i}].after[${j}].glue`, 'a step that has a glue-up', `Step "${after.step}" glues nothing.`);
        }
      });
    });
    plan.faces.forEach((face, i) =>
      face.fasteners.forEach((fastener, j) => {
        if (!fastener.removedIn || !order.comesBefore(fastener.removedIn, fastener.step)) return;
        this.say(
          `faces[${i}].fasteners[${j}].removedIn`,
          'a step after the one that drives it',
          'It would be taken out before it is in.',
        );
      }),
    );
  }

  sizes(): void {
    const { plan } = this;
    plan.keySizes.forEach((size, i) => {
      if (size.range && size.range.min > size.range.max)
        this.say(`keySizes[${i}].range`, 'a least below the greatest', 'The range is upside down.');
      else if (size.range && (size.default < size.range.min || size.default > size.range.max)) {
        this.say(`keySizes[${i}].default`, 'a length within its range', `${size.name} lies outside its own range.`);
      }
    });
    const resolved = resolveKeySizes(plan, {});
    if (!resolved.ok) {
      const at = plan.keySizes.findIndex(({ id }) => id === resolved.keySizeId);
      this.say(`keySizes[${at}].formula`, 'a formula that comes to a length', `${resolved.message}.`);
      return;
    }
    const sizeAt = (size: number | string, path: string) => {
      const result = evaluateSize(size, resolved.values, plan);
      if (!result.ok) this.say(path, 'a formula that comes to a length', `${result.message}.`);
      else if (result.length <= 0) this.say(path, 'a length above zero', 'The formula comes to nothing or less.');
    };
    plan.parts.forEach((part, i) =>
      (['length', 'width', 'thickness'] as const).forEach((side) => sizeAt(part[side], `parts[${i}].${side}`)),
    );
    plan.faces.forEach((face, i) =>
      (['length', 'width'] as const).forEach((side) => sizeAt(face[side], `faces[${i}].${side}`)),
    );
    (['length', 'width', 'height'] as const).forEach((side) => sizeAt(plan.finished[side], `finished.${side}`));
    plan.steps.forEach((step, i) =>
      step.checks.forEach(
        ({ judge }, j) => judge.kind === 'length' && sizeAt(judge.target, `steps[${i}].checks[${j}].judge.target`),
      ),
    );
  }
}
