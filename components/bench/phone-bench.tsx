/** The bench on a phone: one picture at full width, or two small ones; the sheet below, one thumb to work it. */
import { useState } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';
import type { Domain } from '@/components/image/edge-scale';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { useTheme } from '@/components/ui/theme-context';
import { BenchFrames, framesHeight } from './bench-frames';
import { BenchHeader } from './bench-header';
import { closedSheet, paneMargins, pictureSize, proportionOf, sheetHeight, type SheetStep } from './bench-measures';
import { BenchNotices } from './bench-notices';
import { BenchPane } from './bench-pane';
import type { BenchView } from './bench-view';
import { useBench } from './bench-context';
import { BenchSheet } from './bench-sheet';
import { PaneHead } from './pane-head';
import { ProfileStrip } from './profile-strip';
import { contentOf } from './pane-content';
import { ReadoutTable } from './readout-table';
import { useKeepAsTrial } from './use-keep-as-trial';
import { WindowLine } from './window-line';

const tabs: readonly Tab<BenchView['phonePanes']>[] = [
  { value: 'image', label: 'image' },
  { value: 'kspace', label: 'k-space' },
  { value: 'both', label: 'both' },
];
const headHeight = 36;
const smallPicture = 192;
const tabsHeight = 44;
/** Glass and numbers below the picture, window and level; only while the sheet is closed. */
const readoutHeight = 94 + 44;
/** Header, head, edge below the picture, the line of tabs. */
const around = 44 + headHeight + paneMargins.below + tabsHeight;

function SmallPane({ domain, width }: { domain: Domain; width: number }) {
  const { colours } = useTheme();
  const { bad, frame, view, blinksToBad, phaseEncode } = useBench();
  const size = pictureSize({ width, height: width }, proportionOf(frame));
  const content = phaseEncode === null ? 'bad' : contentOf(domain, view, 'simulated', blinksToBad, bad);
  return (
    <View style={{ flexDirection: 'row', backgroundColor: colours.mat, paddingTop: 4 }}>
      <BenchPane domain={domain} side="simulated" {...size} withoutHead />
      <View style={{ flex: 1, minWidth: 0, paddingRight: 12 }}>
        <View style={{ paddingLeft: 12, gap: 4, alignItems: 'flex-start' }}>
          <PaneHead domain={domain} content={content} compact />
        </View>
        <ReadoutTable domain={domain} narrow />
      </View>
    </View>
  );
}

export function PhoneBench() {
  const { colours } = useTheme();
  const { frame, view, change, bad, source } = useBench();
  const screen = useWindowDimensions();
  const [step, setStep] = useState<SheetStep>('closed');
  const keep = useKeepAsTrial();
  const sheet = sheetHeight(step, screen.height);
  const room = {
    width: screen.width - paneMargins.horizontal,
    height:
      screen.height -
      around -
      framesHeight({ bad, source }) -
      (step === 'closed' ? closedSheet + readoutHeight : sheetHeight('half', screen.height)),
  };
  const size = pictureSize(room, proportionOf(frame));
  const { phonePanes } = view;
  const small = Math.min(
    smallPicture,
    (screen.height - 44 - tabsHeight - Math.min(sheet, sheetHeight('half', screen.height))) / 2 - paneMargins.below - 4,
  );
  return (
    <View style={{ flex: 1, minHeight: 0, overflow: 'hidden' }}>
      <BenchHeader layout="phone" keep={keep} />
      <View style={{ height: screen.height - 44 - Math.min(sheet, sheetHeight('half', screen.height)), overflow: 'hidden' }}>
        <ScrollView style={{ flex: 1 }} contentContainerStyle={{ backgroundColor: colours.mat, flexGrow: 1 }}>
          <BenchNotices keep={keep} withKept />
          <BenchFrames />
          {phonePanes === 'both' ? (
            <>
              <SmallPane domain="image" width={small} />
              <SmallPane domain="kspace" width={small} />
            </>
          ) : (
            <>
              <View style={{ alignItems: 'center' }}>
                <BenchPane key={phonePanes} domain={phonePanes} side="simulated" {...size} headHeight={headHeight} />
              </View>
              <ReadoutTable domain={phonePanes} />
              {step === 'closed' ? (
                <View style={{ flexGrow: 1, paddingHorizontal: 16, paddingTop: 6, backgroundColor: colours.cloth }}>
                  <ProfileStrip domain={phonePanes} />
                </View>
              ) : null}
            </>
          )}
        </ScrollView>
        <View style={{ backgroundColor: colours.cloth }}>
          {step === 'closed' && phonePanes !== 'both' ? <WindowLine domain={phonePanes} /> : null}
          <View style={{ borderTopWidth: 1, borderTopColor: colours.rule }}>
            <Tabs label="panes" tabs={tabs} value={phonePanes} onChange={(next) => change({ phonePanes: next })} even ruled={false} />
          </View>
        </View>
      </View>
      <BenchSheet step={step} onStep={setStep} />
    </View>
  );
}
