/** The sign of one thing that can be seen: a head with that fault. */
import { useId } from 'react';
import { fonts } from '@/components/ui/theme';
import { sightingArt, type SightingArt } from './sighting-art';
import type { Case } from '@/server/contract/cases';

const bentOutline = 'M48 5C66 5 64 16 67 28C71 42 62 56 48 56C34 56 27 44 30 30C32 18 26 5 48 5Z';

function Head({ shift, strength, bent }: { shift: number; strength: number; bent: boolean }) {
  return (
    <g transform={`translate(${shift} 0)`} opacity={strength}>
      {bent ? (
        <path d={bentOutline} fill="#8c8c8c" stroke="#f2f2f2" strokeWidth={3} />
      ) : (
        <ellipse cx={48} cy={30} rx={20} ry={25.5} fill="#8c8c8c" stroke="#f2f2f2" strokeWidth={3} />
      )}
      <ellipse cx={48} cy={31} rx={13} ry={18} fill="#b9b9b9" />
      <path d="M44 22C41 27 42 33 45 37M52 22C55 27 54 33 51 37" stroke="#2b2b2b" strokeWidth={3} fill="none" strokeLinecap="round" />
      <path d="M48 9V20M48 42V53" stroke="#3a3a3a" strokeWidth={1.2} />
    </g>
  );
}

function Over({ kind, id }: { kind: NonNullable<SightingArt['over']>; id: string }) {
  if (kind === 'line') return <path d="M0 39.5H96" stroke="#ffffff" strokeWidth={1.5} strokeDasharray="3 1.5" />;
  if (kind === 'shade') return <rect width={96} height={60} fill={`url(#${id}-shade)`} />;
  if (kind === 'void') return <circle cx={58} cy={20} r={8.5} fill={`url(#${id}-void)`} />;
  if (kind === 'fold') {
    return (
      <g fill="none" stroke="#f2f2f2" strokeWidth={3} opacity={0.75}>
        <path d="M28 60A20 18 0 0 1 68 60" />
        <path d="M34 0A14 9 0 0 0 62 0" />
      </g>
    );
  }
  return (
    <text x={48} y={38} textAnchor="middle" fill="#ffffff" fontFamily={fonts.monoMedium} fontSize={22}>
      ?
    </text>
  );
}

export function SightingPicture({ sighting }: { sighting: Case['seen'][number] }) {
  const id = useId();
  const { heads, effect, over } = sightingArt[sighting];
  return (
    <svg viewBox="0 0 96 60" width="100%" aria-hidden style={{ display: 'block', background: '#000' }}>
      <defs>
        <filter id={`${id}-blur`}>
          <feGaussianBlur stdDeviation="2.2 0.6" />
        </filter>
        <filter id={`${id}-noise`} x="0" y="0" width="1" height="1">
          <feTurbulence type="fractalNoise" baseFrequency={1.1} numOctaves={2} seed={7} result="grain" />
          <feColorMatrix in="grain" type="matrix" values="0 0 0 0 1  0 0 0 0 1  0 0 0 0 1  2.4 0 0 0 -1" result="specks" />
          <feBlend in="specks" in2="SourceGraphic" mode="overlay" />
        </filter>
        <linearGradient id={`${id}-shade`} x1="1" y1="0" x2="0" y2="1">
          <stop offset="0.35" stopColor="#000" stopOpacity={0} />
          <stop offset="0.85" stopColor="#000" stopOpacity={0.92} />
        </linearGradient>
        <radialGradient id={`${id}-void`}>
          <stop offset="0.6" stopColor="#000" />
          <stop offset="1" stopColor="#000" stopOpacity={0} />
        </radialGradient>
      </defs>
      <g filter={effect === 'blur' || effect === 'noise' ? `url(#${id}-${effect})` : undefined}>
        {heads.map(({ shift, strength }) => (
          <Head key={shift} shift={shift} strength={strength} bent={effect === 'bend'} />
        ))}
        {effect === 'noise' ? <rect width={96} height={60} fill="#fff" opacity={0.08} /> : null}
      </g>
      {over ? <Over kind={over} id={id} /> : null}
    </svg>
  );
}
