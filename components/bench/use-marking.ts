/**
 * Marks of the picture on the table, and drawing a new one: by a drag, or by the keyboard (Enter sets one end at the cursor, the arrows
 * move it, Enter sets the other). Words are set where the picture is pressed.
 */
import { useMemo, useState } from 'react';
import { useAddMark, useMarks } from '@/components/api/marks';
import type { Cursor } from '@/components/image/cursor';
import type { Domain } from '@/components/image/edge-scale';
import type { PictureMark } from '@/components/image/mark-words';
import type { Mark } from '@/server/contract/case-parts';
import { useBench, useCaseOnBench } from './bench-context';

type Sample = readonly [column: number, row: number];

/** a, b, c … z, then a2, b2 …: how a mark is called on the picture and in the list. */
export function letterOf(index: number): string {
  const round = Math.floor(index / 26);
  return `${String.fromCharCode(97 + (index % 26))}${round > 0 ? round + 1 : ''}`;
}

export interface LetteredMark {
  readonly letter: string;
  readonly mark: Mark;
}

/** Marks on the bad image, oldest first, each with its letter. */
export function useLetteredMarks(): readonly LetteredMark[] {
  const { kase, bad } = useCaseOnBench();
  const { data } = useMarks(kase.id);
  return useMemo(() => {
    const own = (data ?? []).filter(({ imageId }) => imageId === bad.id);
    const oldestFirst = [...own].sort((a, b) => a.createdAt.localeCompare(b.createdAt));
    return oldestFirst.map((mark, index) => ({ letter: letterOf(index), mark }));
  }, [data, bad.id]);
}

const shortest = 2;

export function useMarking(domain: Domain) {
  const { kase, bad, view, change } = useBench();
  const lettered = useLetteredMarks();
  const add = useAddMark(kase.id);
  const [draft, setDraft] = useState<readonly [Sample, Sample] | null>(null);
  const { tool, markText } = view;

  const keep = (points: readonly Sample[]): void => {
    setDraft(null);
    if (!tool) return;
    add.mutate(
      { imageId: bad.id, frame: view.badFrame, domain, kind: tool, points: points.map(([column, row]) => [column, row]), text: markText },
      { onSuccess: () => change({ tool: null, markText: '' }) },
    );
  };
  const draws = tool !== null && tool !== 'text';

  const marks = useMemo<PictureMark[]>(() => {
    const kept = lettered
      .filter(({ mark }) => mark.domain === domain && mark.frame === view.badFrame)
      .map(({ letter, mark: { id, kind, points, text } }) => ({ id, letter, kind, points, text }));
    return draft && tool ? [...kept, { id: 'draft', letter: '', kind: tool, points: draft, text: '' }] : kept;
  }, [lettered, domain, draft, tool, view.badFrame]);

  return {
    marks,
    onPress: ({ row, column }: Cursor) => {
      if (tool === 'text' && markText.trim()) keep([[column, row]]);
      else if (draft) setDraft([draft[0], [column, row]]);
    },
    onDraw: draws
      ? (from: Sample, to: Sample, done: boolean) => {
          const isLongEnough = Math.abs(to[0] - from[0]) + Math.abs(to[1] - from[1]) >= shortest;
          if (done && isLongEnough) keep([from, to]);
          else setDraft(done ? null : [from, to]);
        }
      : undefined,
    onEnter: draws
      ? () => {
          const here: Sample = [view.cursor.column, view.cursor.row];
          if (draft) keep([draft[0], here]);
          else setDraft([here, here]);
        }
      : undefined,
  };
}
