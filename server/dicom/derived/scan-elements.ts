/** The scan that the picture was simulated from: its timing, and the device it ran on. What the header did not say is left empty or out. */
import type { FactName, ScanFacts } from '../../contract/facts';
import type { ElementToWrite } from '../elements';
import { acquisitionEquipment, codeItem } from './deidentification-record';
import type { Derivation } from './derivation';

/** Facts that are written as they are where they are known; a model of the recipe may have changed others. */
const known: readonly (readonly [FactName, tag: string, vr: string])[] = [
  ['inversionTimeMs', '0018,0082', 'DS'],
  ['averages', '0018,0083', 'DS'],
  ['imagingFrequencyMHz', '0018,0084', 'DS'],
  ['fieldStrengthTesla', '0018,0087', 'DS'],
  ['sliceSpacingMm', '0018,0088', 'DS'],
  ['bandwidthPerPixelHz', '0018,0095', 'DS'],
  ['receiveCoil', '0018,1250', 'SH'],
  ['flipAngleDegrees', '0018,1314', 'DS'],
  ['bodyPart', '0018,0015', 'CS'],
];

const softwareVersions = '0018,1020';

/** Of the MR Image module (PS3.3 C.8.3.1). Where the header named no sequence, RM, research mode, is the standard's word. */
export function scanElements({ facts, phaseEncode }: Derivation): ElementToWrite[] {
  return [
    { tag: '0018,0020', vr: 'CS', value: words(facts.scanningSequence.value) ?? 'RM' },
    { tag: '0018,0021', vr: 'CS', value: words(facts.sequenceVariant.value) ?? 'NONE' },
    { tag: '0018,0022', vr: 'CS', value: words(facts.scanOptions.value) ?? '' },
    { tag: '0018,0023', vr: 'CS', value: facts.acquisitionType.value ?? '' },
    { tag: '0018,0080', vr: 'DS', value: facts.repetitionTimeMs.value ?? '' },
    { tag: '0018,0081', vr: 'DS', value: facts.echoTimeMs.value ?? '' },
    { tag: '0018,0091', vr: 'IS', value: facts.echoTrainLength.value === null ? '' : String(Math.round(facts.echoTrainLength.value)) },
    { tag: '0018,1312', vr: 'CS', value: phaseEncode === 'column' ? 'COL' : 'ROW' },
    ...timeOfDay(facts),
    ...known.flatMap(([name, tag, vr]) => present(tag, vr, facts[name])),
  ];
}

/** The scanner, in Contributing Equipment Sequence, whose items must name a manufacturer; left out where nothing is known of it. */
export function contributingEquipment({ facts }: Derivation): ElementToWrite[] {
  const [manufacturer = { tag: '0008,0070', vr: 'LO', value: 'unknown' }] = present('0008,0070', 'LO', facts.manufacturer);
  const device = [
    ...present('0008,1090', 'LO', facts.model),
    ...present(softwareVersions, 'LO', facts.softwareVersions),
    ...present('0018,1000', 'LO', facts.deviceSerial),
    ...present('0008,1010', 'SH', facts.stationName),
  ];
  if (device.length === 0 && facts.manufacturer.value === null) return [];
  const purpose: ElementToWrite = { tag: '0040,A170', vr: 'SQ', value: [codeItem(acquisitionEquipment)] };
  return [{ tag: '0018,A001', vr: 'SQ', value: [[manufacturer, ...device, purpose]] }];
}

const timeOfDay = ({ timeOfDay: { value } }: ScanFacts): ElementToWrite[] =>
  value === null ? [] : [{ tag: '0008,0032', vr: 'TM', value: value.replaceAll(':', '') }];

/** Values of a header that stood in it separated by backslashes. */
const words = (text: string | null): string[] | undefined => (text === null || text === '' ? undefined : text.split('\\'));

type Known = { readonly value: unknown; readonly origin: string };

/** What is doubtful is not passed on. Of a text with several values the first, but where the standard takes several. */
function present(tag: string, vr: string, { value, origin }: Known): ElementToWrite[] {
  if (origin === 'doubtful') return [];
  if (typeof value === 'number') return [{ tag, vr, value }];
  const texts = typeof value === 'string' ? words(value) : undefined;
  if (texts === undefined) return [];
  return [{ tag, vr, value: tag === softwareVersions ? texts : texts.slice(0, 1) }];
}
