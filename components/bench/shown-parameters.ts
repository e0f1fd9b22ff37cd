/** Which parameters a form shows: those that matter at the choices made. The values of the others are kept. */
import type { CatalogueParameter } from '@/server/contract/catalogue';

export const shownParameters = (
  parameters: readonly CatalogueParameter[],
  values: Readonly<Record<string, number | string>>,
): CatalogueParameter[] =>
  parameters.filter(({ when = {} }) =>
    Object.entries(when).every(([id, shownAt]) => {
      const chosen = values[id] ?? parameters.find((parameter) => parameter.id === id)?.initial;
      return shownAt.some((value) => value === chosen);
    }),
  );
