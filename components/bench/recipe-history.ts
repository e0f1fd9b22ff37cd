/**
 * The recipe on the bench and the way back: a pure reducer. A drag of one slider is one step back, however many values it
 * passed; every other change is a step of its own. Undo and redo walk the line, a new change cuts off what lay ahead.
 */
import type { Recipe, RecipeStep } from '@/server/contract/recipe';

export interface RecipeHistory {
  readonly past: readonly Recipe[];
  readonly present: Recipe;
  readonly future: readonly Recipe[];
  /** The control that made the last change, while its gesture lasts. */
  readonly held: string | null;
}

export type Value = number | string;

export type RecipeAction =
  | { kind: 'add'; step: RecipeStep; objectPhase?: Recipe['objectPhase'] }
  | { kind: 'set-parameter'; step: number; parameter: string; value: Value }
  | { kind: 'switch'; step: number }
  | { kind: 'remove'; step: number }
  | { kind: 'set-reconstruction'; reconstruction: Recipe['reconstruction'] }
  | { kind: 'set-reconstruction-parameter'; parameter: string; value: Value }
  | { kind: 'set-object-phase'; range: number }
  | { kind: 'open'; recipe: Recipe }
  /** Another recipe in its place, with the way back. */
  | { kind: 'replace'; recipe: Recipe }
  /** The hand left the control: the next change is another step back. */
  | { kind: 'let-go' }
  | { kind: 'undo' }
  | { kind: 'redo' };

const longestPast = 200;

export const startHistory = (recipe: Recipe): RecipeHistory => ({ past: [], present: recipe, future: [], held: null });

const isOn = (step: RecipeStep): boolean => step.enabled !== false;

const withStep = (recipe: Recipe, index: number, change: (step: RecipeStep) => RecipeStep): Recipe => ({
  ...recipe,
  steps: recipe.steps.map((step, i) => (i === index ? change(step) : step)),
});

type Change = Exclude<RecipeAction, { kind: 'let-go' | 'undo' | 'redo' | 'open' }>;

function changed(recipe: Recipe, action: Change): Recipe {
  switch (action.kind) {
    case 'add': {
      const steps = [...recipe.steps, action.step];
      return action.objectPhase && !recipe.objectPhase ? { ...recipe, steps, objectPhase: action.objectPhase } : { ...recipe, steps };
    }
    case 'set-parameter':
      return withStep(recipe, action.step, (step) => ({ ...step, parameters: { ...step.parameters, [action.parameter]: action.value } }));
    case 'switch':
      return withStep(recipe, action.step, (step) => ({ ...step, enabled: !isOn(step) }));
    case 'replace':
      return action.recipe;
    case 'remove':
      return { ...recipe, steps: recipe.steps.filter((_, i) => i !== action.step) };
    case 'set-reconstruction':
      return { ...recipe, reconstruction: action.reconstruction };
    case 'set-reconstruction-parameter': {
      const { method, parameters } = recipe.reconstruction;
      return { ...recipe, reconstruction: { method, parameters: { ...parameters, [action.parameter]: action.value } } };
    }
    case 'set-object-phase':
      return {
        ...recipe,
        objectPhase: action.range > 0 ? { range: action.range, seed: recipe.objectPhase?.seed ?? recipe.seed } : undefined,
      };
  }
}

/** Names the control behind a change where a drag makes many of them. */
function controlOf(action: Change): string | null {
  switch (action.kind) {
    case 'set-parameter':
      return `step ${action.step} ${action.parameter}`;
    case 'set-reconstruction-parameter':
      return `reconstruction ${action.parameter}`;
    case 'set-object-phase':
      return 'object phase';
    default:
      return null;
  }
}

function step(history: RecipeHistory, from: readonly Recipe[], direction: 'undo' | 'redo'): RecipeHistory {
  const recipe = direction === 'undo' ? from.at(-1) : from[0];
  if (!recipe) return history;
  const { past, present, future } = history;
  return direction === 'undo'
    ? { past: past.slice(0, -1), present: recipe, future: [present, ...future], held: null }
    : { past: [...past, present], present: recipe, future: future.slice(1), held: null };
}

export function recipeHistory(history: RecipeHistory, action: RecipeAction): RecipeHistory {
  switch (action.kind) {
    case 'undo':
      return step(history, history.past, 'undo');
    case 'redo':
      return step(history, history.future, 'redo');
    case 'let-go':
      return history.held === null ? history : { ...history, held: null };
    case 'open':
      return startHistory(action.recipe);
    default: {
      const control = controlOf(action);
      const goesOn = control !== null && control === history.held;
      const past = goesOn ? history.past : [...history.past, history.present].slice(-longestPast);
      return { past, present: changed(history.present, action), future: [], held: control };
    }
  }
}
