/** The three steps. Any of them can be gone to at any time; a step that was passed is darker. */
import { Tabs } from '@/components/ui/tabs';

export const steps = ['images', 'see', 'tried'] as const;
export type Step = (typeof steps)[number];

const words: Record<Step, string> = { images: '1 images', see: '2 what you see', tried: '3 what was tried' };

interface StepTabsProps {
  step: Step;
  onChange: (step: Step) => void;
  even: boolean;
}

export function StepTabs({ step, onChange, even }: StepTabsProps) {
  return <Tabs label="steps" even={even} value={step} onChange={onChange} tabs={steps.map((value) => ({ value, label: words[value] }))} />;
}
