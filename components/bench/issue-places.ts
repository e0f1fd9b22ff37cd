/** Where on the bench an issue of the server belongs: at the slider, the step, the reconstruction, or at the panes. */
import type { Issue } from '@/server/contract/problem';

export interface IssuePlaces {
  /** Message for a control: `step index/parameter`, `reconstruction/parameter`, `objectPhase`. */
  readonly atControl: ReadonlyMap<string, string>;
  /** Messages that no control on the bench can carry. */
  readonly elsewhere: readonly string[];
}

export const stepControl = (step: number, parameter: string): string => `${step}/${parameter}`;
export const reconstructionControl = (parameter: string): string => `reconstruction/${parameter}`;
export const objectPhaseControl = 'objectPhase';

/** The control that a path into the request points at, or null. The path may start at `recipe` or inside it. */
export function controlAt(path: readonly (string | number)[]): string | null {
  const [head, second, third, fourth] = path[0] === 'recipe' ? path.slice(1) : path;
  if (head === 'steps' && second !== undefined && third === 'parameters' && fourth !== undefined)
    return stepControl(Number(second), String(fourth));
  if (head === 'reconstruction' && second === 'parameters' && third !== undefined) return reconstructionControl(String(third));
  if (head === 'objectPhase') return objectPhaseControl;
  return null;
}

export function placeIssues(issues: readonly Issue[]): IssuePlaces {
  const atControl = new Map<string, string>();
  const elsewhere: string[] = [];
  for (const { path, message } of issues) {
    const control = controlAt(path);
    if (control === null) elsewhere.push(message);
    else atControl.set(control, message);
  }
  return { atControl, elsewhere };
}
