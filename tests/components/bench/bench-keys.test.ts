/** Keys of the bench: undo and redo as common practice has them. */
import { actionOfKey } from '@/components/bench/bench-keys';

const press = (key: string, held: Partial<Record<'ctrlKey' | 'metaKey' | 'shiftKey', boolean>> = {}) =>
  actionOfKey({ key, ctrlKey: false, metaKey: false, shiftKey: false, ...held });

describe('the keys of the bench', () => {
  it('undo with Control or Command and Z, redo with Shift beside it or with Y', () => {
    expect(press('z', { ctrlKey: true })).toEqual({ kind: 'undo' });
    expect(press('z', { metaKey: true })).toEqual({ kind: 'undo' });
    expect(press('Z', { ctrlKey: true, shiftKey: true })).toEqual({ kind: 'redo' });
    expect(press('y', { ctrlKey: true })).toEqual({ kind: 'redo' });
  });

  it('leave every other key alone', () => {
    expect([press('z'), press('x', { ctrlKey: true })]).toEqual([null, null]);
  });
});
