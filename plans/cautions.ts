import type { PlanDocumentInput } from '@/lib/domain/plan/document';

type Caution = NonNullable<PlanDocumentInput['steps'][number]['cautions']>[number];

const danger = (about: string, what: string): Caution => ({ level: 'danger', about, do: what });
const care = (about: string, what: string): Caution => ({ level: 'care', about, do: what });

/**
 * What to do so that nobody is hurt, by operation. In our words after 29 CFR 1910.213 (guard, spreader, push sticks),
 * 29 CFR 1910.95 (noise), NIOSH 94-110 (lifting) and common practice; the tool's manual comes first.
 */
export const cautions = {
  tableSaw: danger(
    'Hands',
    'Guard and riving knife on. Push stick for anything under 6 in wide; never stand in line with the piece, never reach past the blade. The saw’s manual comes first.',
  ),
  crosscut: danger(
    'Hands',
    'Hands well away from the blade on each side, 6 in (150 mm) at the least, piece held to the fence. Wait till the blade stands still before you lift it or clear an offcut.',
  ),
  small: danger('Short piece', 'Under 8 in hold it with a clamp, not a hand, or cut it from a longer piece first.'),
  trackSaw: danger(
    'Cord and hands',
    'Sheet fully supported on both sides of the cut, depth just through. Let the blade stop before you lift the saw off.',
  ),
  router: danger(
    'Hands and eyes',
    'Work clamped, bit tight, cut against the turn of the bit, in passes of 1/8 in. Unplug it to change the bit. Safety glasses.',
  ),
  drill: danger('Eyes', 'Clamp the piece, hold the drill with both hands where it can bind. Safety glasses.'),
  planer: danger(
    'Kickback',
    'Nothing shorter than 12 in or thinner than the manual allows. Stand to the side; never look into the machine while it runs.',
  ),
  jointer: danger('Hands', 'Guard on, push blocks for faces, nothing under 12 in long. Never a hand over the cutter.'),
  ears: danger('Ears', 'Hearing protection while a machine runs.'),
  dust: danger('Lungs', 'Extraction on and a fitted N95 mask: oak dust irritates and can harm the lungs for good.'),
  glue: care(
    'Time',
    'Everything laid out dry first. Once glue touches wood you have the open time on the label and no more.',
  ),
  clamps: danger('Fingers', 'Fingers out of the jaws; long clamps tip an assembly, so stand it where it cannot fall.'),
  brads: danger(
    'Hands',
    'Hold the piece well away from where the brad goes: a brad can turn and come out of the side.',
  ),
  screws: care('Splitting', 'Oak splits: drill the pilot and the clearance hole before you drive.'),
  solvent: danger('Fire and lungs', 'Open the door, no flame and no sparks. Wear the respirator the label asks for.'),
  rags: danger(
    'Fire',
    'Oily rags can catch fire by themselves: lay them flat outdoors to dry, or in water in a closed metal can. The label comes first.',
  ),
  lift: danger('Back', 'Two people for this. Lift with straight arms close to the body, and say when.'),
  lid: danger('Fingers', 'A lid that falls crushes fingers. Hold it with a prop until both stays are on and tested.'),
  chisel: danger('Hands', 'Both hands behind the edge, work clamped.'),
};
