/** A result of a worker whose large arrays move to the server's thread instead of being copied. The worker must not use them again. */
import { move, transferableSymbol, valueSymbol } from 'piscina';

/** Marks `result` so that `buffers`, which lie anywhere in it, are transferred with it. */
export const handBack = <Result extends object>(result: Result, buffers: ArrayBufferLike[]): Result =>
  move({ [transferableSymbol]: buffers, [valueSymbol]: result }) as unknown as Result;
