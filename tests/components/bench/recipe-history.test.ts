/** Undo and redo of a recipe: common practice of every editor, and the rule that one drag is one step back. */
import { recipeHistory, startHistory, type RecipeAction } from '@/components/bench/recipe-history';

const empty = { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };
const motion = { cause: 'periodic-motion', parameters: { frequency: 0.25, swing: 0.4 } };
const run = (...actions: RecipeAction[]) => actions.reduce(recipeHistory, startHistory(empty));
const swing = (value: number): RecipeAction => ({ kind: 'set-parameter', step: 0, parameter: 'swing', value });

describe('the history of a recipe', () => {
  it('starts with nothing to undo', () => {
    expect(run({ kind: 'undo' })).toEqual(startHistory(empty));
  });

  it('goes back and forth', () => {
    const added = run({ kind: 'add', step: motion });
    expect(added.present.steps).toEqual([motion]);
    const undone = recipeHistory(added, { kind: 'undo' });
    expect(undone.present).toEqual(empty);
    expect(recipeHistory(undone, { kind: 'redo' }).present).toEqual(added.present);
  });

  it('takes one drag of a slider as one step back, however many values it passed', () => {
    const dragged = run({ kind: 'add', step: motion }, swing(0.5), swing(0.6), swing(0.7), { kind: 'let-go' });
    expect(dragged.present.steps[0]?.parameters.swing).toBe(0.7);
    expect(recipeHistory(dragged, { kind: 'undo' }).present.steps[0]?.parameters.swing).toBe(0.4);
  });

  it('takes two drags of the same slider as two steps back', () => {
    const twice = run({ kind: 'add', step: motion }, swing(0.5), { kind: 'let-go' }, swing(0.9));
    expect(recipeHistory(twice, { kind: 'undo' }).present.steps[0]?.parameters.swing).toBe(0.5);
  });

  it('does not mix two sliders into one step back', () => {
    const both = run({ kind: 'add', step: motion }, swing(0.5), { kind: 'set-parameter', step: 0, parameter: 'frequency', value: 0.3 });
    expect(recipeHistory(both, { kind: 'undo' }).present.steps[0]?.parameters).toEqual({ frequency: 0.25, swing: 0.5 });
  });

  it('cuts off what lay ahead when something new is done', () => {
    const changed = run({ kind: 'add', step: motion }, { kind: 'undo' }, { kind: 'set-object-phase', range: 1 });
    expect(changed.future).toEqual([]);
    expect(recipeHistory(changed, { kind: 'redo' })).toBe(changed);
  });

  it('switches a step off without losing its values, and on again', () => {
    const off = run({ kind: 'add', step: motion }, { kind: 'switch', step: 0 });
    expect(off.present.steps[0]).toEqual({ ...motion, enabled: false });
    expect(recipeHistory(off, { kind: 'switch', step: 0 }).present.steps[0]?.enabled).toBe(true);
  });

  it('brings an object phase with a cause that needs one, and keeps one that is there', () => {
    const phase = { range: 1.6, seed: 1 };
    expect(run({ kind: 'add', step: motion, objectPhase: phase }).present.objectPhase).toEqual(phase);
    const kept = run({ kind: 'set-object-phase', range: 3 }, { kind: 'add', step: motion, objectPhase: phase });
    expect(kept.present.objectPhase?.range).toBe(3);
  });

  it('has no object phase at a range of zero', () => {
    expect(run({ kind: 'set-object-phase', range: 1 }, { kind: 'set-object-phase', range: 0 }).present.objectPhase).toBeUndefined();
  });

  it('starts anew when a trial is opened', () => {
    const opened = run({ kind: 'add', step: motion }, { kind: 'open', recipe: { ...empty, seed: 7 } });
    expect(opened).toEqual(startHistory({ ...empty, seed: 7 }));
  });
});
