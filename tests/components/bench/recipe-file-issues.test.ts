/** Where a recipe file is wrong is said as a place in the file, steps counted from 1; opening one can be undone. */
import { issueLines } from '@/components/bench/recipe-file-issues';
import { recipeHistory, startHistory } from '@/components/bench/recipe-history';

test('each fault is a line with its place', () => {
  const issues = [
    { path: ['file', 'recipe', 'steps', 0, 'parameters', 'frequency'], message: 'must be less' },
    { path: ['file', 'version'], message: 'another version' },
    { path: [], message: 'nothing fits' },
  ];
  expect(issueLines(issues)).toEqual([
    'recipe › steps › 1 › parameters › frequency: must be less',
    'version: another version',
    'nothing fits',
  ]);
});

test('a recipe that was opened from a file can be undone', () => {
  const before = { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };
  const opened = { ...before, seed: 7 };
  const after = recipeHistory(startHistory(before), { kind: 'replace', recipe: opened });
  expect(after.present).toBe(opened);
  expect(recipeHistory(after, { kind: 'undo' }).present).toBe(before);
});
