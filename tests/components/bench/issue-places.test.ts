/** Issues of the server at the control that they concern: the paths of server/contract/problem.ts. */
import { placeIssues } from '@/components/bench/issue-places';

describe('an issue of the server', () => {
  it('stands at the slider that it concerns', () => {
    const { atControl, elsewhere } = placeIssues([
      { path: ['recipe', 'steps', 1, 'parameters', 'fraction'], message: 'fraction must be at least 0.5, got 0.1' },
      { path: ['steps', 0, 'parameters', 'factor'], message: 'factor must be at most 8, got 9' },
      { path: ['recipe', 'reconstruction', 'parameters', 'iterations'], message: 'iterations must be whole' },
      { path: ['recipe', 'objectPhase', 'range'], message: 'range must be at most 6.28' },
    ]);
    expect(elsewhere).toEqual([]);
    expect([...atControl.keys()]).toEqual(['1/fraction', '0/factor', 'reconstruction/iterations', 'objectPhase']);
  });

  it('stands beside the panes where no control can carry it', () => {
    expect(placeIssues([{ path: ['imageId'], message: 'no such image' }]).elsewhere).toEqual(['no such image']);
  });
});
