/**
 * Tissues with their relaxation times at 1.5 T and 3 T. Published values scatter by a fifth and more between methods and people: these
 * give pictures of the right kind, not a measurement. Proton densities and fat fractions are from memory throughout.
 */
import { material } from './material';

/** Its 3 T values are confirmed by the abstract, those at 1.5 T are from memory. */
const abdomen = 'de Bazelaire et al., Radiology 2004;230:652, doi 10.1148/radiol.2303021331';
const samples = 'Stanisz et al., Magn Reson Med 2005;54:507 (from memory)';
/** T1 of both, confirmed by its abstract (646 and 1197 ms at 1.5 T, 838 and 1607 ms at 3 T); T2 after Stanisz. */
const brain = 'Wright et al., MAGMA 2008;21:121; T2: Stanisz et al., Magn Reson Med 2005;54:507 (from memory)';
const memory = 'from memory';

export const tissues = {
  grey: material('Grey matter', { protonDensity: 0.8, t1Ms: [1197, 1607], t2Ms: [95, 99], source: brain }),
  white: material('White matter', { protonDensity: 0.7, t1Ms: [646, 838], t2Ms: [72, 69], source: brain }),
  fluid: material('Cerebrospinal fluid', { protonDensity: 1, t1Ms: [4200, 4200], t2Ms: [2000, 2000], source: memory }),
  cord: material('Spinal cord', { protonDensity: 0.75, t1Ms: [745, 993], t2Ms: [74, 78], source: samples }),
  blood: material('Blood', { protonDensity: 0.85, t1Ms: [1441, 1932], t2Ms: [290, 275], source: samples }),
  muscle: material('Skeletal muscle', { protonDensity: 0.79, t1Ms: [1008, 1412], t2Ms: [44, 50], source: samples }),
  liver: material('Liver', { protonDensity: 0.71, fatFraction: 0.03, t1Ms: [586, 809], t2Ms: [46, 34], source: abdomen }),
  spleen: material('Spleen', { protonDensity: 0.78, t1Ms: [1057, 1328], t2Ms: [79, 61], source: abdomen }),
  pancreas: material('Pancreas', { protonDensity: 0.73, fatFraction: 0.05, t1Ms: [584, 725], t2Ms: [46, 43], source: abdomen }),
  kidneyCortex: material('Kidney cortex', { protonDensity: 0.8, t1Ms: [966, 1142], t2Ms: [87, 76], source: abdomen }),
  kidneyMedulla: material('Kidney medulla', { protonDensity: 0.85, t1Ms: [1412, 1545], t2Ms: [85, 81], source: abdomen }),
  marrow: material('Bone marrow', { protonDensity: 0.65, fatFraction: 0.4, t1Ms: [549, 586], t2Ms: [49, 49], source: abdomen }),
  fat: material('Subcutaneous fat', { protonDensity: 0.9, fatFraction: 0.95, t1Ms: [343, 382], t2Ms: [58, 68], source: abdomen }),
  skin: material('Skin', { protonDensity: 0.6, t1Ms: [900, 1100], t2Ms: [30, 28], source: memory }),
  bone: material('Cortical bone', { protonDensity: 0.15, t1Ms: [250, 300], t2Ms: [0.5, 0.4], source: memory }),
  bile: material('Bile', { protonDensity: 0.95, t1Ms: [1500, 1600], t2Ms: [500, 400], source: memory }),
  stomachFluid: material('Fluid of the stomach', { protonDensity: 1, t1Ms: [2500, 2600], t2Ms: [600, 500], source: memory }),
} as const;
