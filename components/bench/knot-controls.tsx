/** The controls of the chosen knot: the object's phase, the parameters of a step, or the reconstruction. */
import { useBench } from './bench-context';
import { ObjectControls } from './object-controls';
import { ReconstructionControls } from './reconstruction-controls';
import { StepControls } from './step-controls';

export function KnotControls({ columns }: { columns: 1 | 3 }) {
  const { view, history } = useBench();
  const { knot } = view;
  if (knot === 'reconstruction') return <ReconstructionControls columns={columns} />;
  if (knot === 'object' || !history.present.steps[knot]) return <ObjectControls columns={columns} />;
  return <StepControls index={knot} columns={columns} />;
}
