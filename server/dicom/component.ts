/**
 * Which part of the complex signal a frame shows. Attributes: Complex Image Component (PS3.3 C.8.13.3.1.1), else the values of Image Type from
 * the third on, which the standard leaves to the maker: one letter on most scanners, words on some (common practice).
 */
import type { Header } from './header';
import { refuse, type Refused } from './refusal';

export type StoredComponent = 'magnitude' | 'phase' | 'real' | 'imaginary';

const components: Readonly<Record<string, StoredComponent>> = {
  M: 'magnitude',
  MAGNITUDE: 'magnitude',
  P: 'phase',
  PHASE: 'phase',
  'PHASE MAP': 'phase',
  R: 'real',
  REAL: 'real',
  I: 'imaginary',
  IMAGINARY: 'imaginary',
};

/** The private number by which one maker tells the component, where Image Type does not (from memory: GE, image kind). */
const privateComponents = ['M', 'P', 'R', 'I'];
const privateCreatorOfComponents = 'GEMS_PARM_01';

/** What the header says at all, else magnitude: that is what scanners store unless they are asked for more (common practice). */
export function componentOf(header: Header): StoredComponent | Refused {
  const values = [header.text('complexImageComponent'), ...typeOf(header).slice(2), privateComponent(header)];
  const named = values.map((value) => components[value ?? '']).filter((component) => component !== undefined);
  const other = named.find((component) => component !== 'magnitude');
  if (other !== undefined) return other;
  if (named.length > 0 || !values.includes('MIXED')) return 'magnitude';
  return refuse('not-magnitude', 'The file mixes complex components and does not say which frame is which. Export them one by one.');
}

const typeOf = (header: Header): readonly string[] => {
  const frameType = header.texts('frameType');
  return frameType.length > 0 ? frameType : header.texts('imageType');
};

function privateComponent(header: Header): string | undefined {
  if (header.text('geParametersCreator') !== privateCreatorOfComponents) return undefined;
  return privateComponents[header.number('geImageKind') ?? -1];
}
