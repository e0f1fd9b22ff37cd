/**
 * Attributes with a vocabulary: only words of the vocabulary are kept, so that nothing else can hide behind their tags.
 * Defined terms: DICOM PS3.3 C.7.3.1.1.2 (Patient Position), C.8.3.1 (Scanning Sequence, Sequence Variant, Scan Options), PS3.16
 * annex L (body parts). Words beyond the standard's are what scanners write (common practice).
 */
import type { AttributeName } from '../allow-list';
import type { Header } from '../header';
import { absent, fromHeader, type Fact } from './fact';

const words = (text: string): ReadonlySet<string> => new Set(text.split(/\s+/));

const vocabularies = {
  scanningSequence: words('SE IR GR EP RM'),
  sequenceVariant: words('SK MTC SS TRSS SP MP OSP NONE OTHER'),
  scanOptions: words(
    'PER RG CG PPG FC PFF PFP SP FS FR CT WE NP NPW GAT MR MT IR DB EDR EXT FAT SAT T1 T2 ACC_GEMS CL_GEMS DC_GEMS EDR_GEMS EPI_GEMS EXT_GEMS FAST_GEMS FC_FREQ_AX_GEMS FC_SLICE_AX_GEMS FILTERED_GEMS FR_GEMS GRAPH_GEMS IFLOW_GEMS MP_GEMS NP_GEMS PFF_GEMS RAMP_IN_GEMS RC_GEMS RESP_COMP_GEMS SAT_GEMS SS_GEMS TAG_GEMS TRF_GEMS VASCTOF_GEMS VB_GEMS',
  ),
  imageType: words(
    'ORIGINAL DERIVED PRIMARY SECONDARY OTHER NONE M P R I MAGNITUDE MPR AXIAL LOCALIZER MOSAIC ND NORM DIS2D DIS3D FIL FM FS SE FSE IR GR EP EPI GE FFE TSE TFE PROJECTION MIP MINIP MAX MIN MEAN ADD SUB SUBTRACTION REFORMATTED RESAMPLED ADC FA TRACEW DIFFUSION EADC TENSOR T1 T2 T2* PD IP OP W F WATER FAT IN_PHASE OUT_PHASE M_SE M_FFE M_IR M_TSE M_TFE COMPOSED MFSPLIT PERFUSION ASL SWI MNIP TTP RCBV RCBF',
  ),
  patientPosition: words('HFS HFP HFDR HFDL FFS FFP FFDR FFDL LFP LFS RFP RFS AFDR AFDL PFDR PFDL'),
  bodyPart: words(
    'ABDOMEN ABDOMENPELVIS ANKLE ARM BILE BLADDER BRACHIALPLEXUS BRAIN BREAST CALF CAROTID CHEST CHESTABDOMEN CLAVICLE COCCYX CSPINE ELBOW EXTREMITY EYE FEMUR FINGER FOOT FOREARM HAND HEAD HEADNECK HEART HIP HUMERUS JAW KIDNEY KNEE LEG LIVER LSPINE LSSPINE LUNG NECK ORBIT PANCREAS PELVIS PHANTOM PROSTATE SHOULDER SKULL SPINE SPLEEN SSPINE STERNUM TESTIS THIGH THUMB TMJ TOE TSPINE UTERUS WHOLEBODY WRIST',
  ),
} as const satisfies Partial<Record<AttributeName, ReadonlySet<string>>>;

export type WordsName = keyof typeof vocabularies;
export const wordsNames = Object.keys(vocabularies) as readonly WordsName[];

export interface ScreenedWords {
  readonly kept: readonly string[];
  readonly nWithheld: number;
}

export function screenedWords(header: Header, name: WordsName): ScreenedWords {
  const present = header.texts(name).filter((value) => value !== '');
  const vocabulary: ReadonlySet<string> = vocabularies[name];
  const kept = present.filter((value) => vocabulary.has(value));
  return { kept, nWithheld: present.length - kept.length };
}

/** The words that are known, joined as the header joins them. */
export function wordsFact(header: Header, name: WordsName): Fact<string> {
  const { kept, nWithheld } = screenedWords(header, name);
  const note = nWithheld === 0 ? undefined : `${nWithheld} value${nWithheld === 1 ? '' : 's'} outside the known vocabulary left out.`;
  return kept.length === 0 ? absent(note) : fromHeader(kept.join('\\'), note);
}
