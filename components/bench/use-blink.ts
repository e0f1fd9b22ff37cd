/**
 * Blink: the two pictures in turn, one second for both, slow enough for every eye (WCAG 2.3.1: no more than three flashes a second).
 * Where the system asks for no motion nothing moves by itself, and the hand turns the pictures.
 */
import { useEffect, useState } from 'react';

const halfPeriodMs = 500;

export function useBlink(isOn: boolean): { blinksToBad: boolean; holdBlink: (toBad: boolean) => void } {
  const [blinksToBad, setBlinksToBad] = useState(true);
  useEffect(() => {
    if (!isOn || window.matchMedia('(prefers-reduced-motion: reduce)').matches) return undefined;
    const timer = setInterval(() => setBlinksToBad((toBad) => !toBad), halfPeriodMs);
    return () => clearInterval(timer);
  }, [isOn]);
  return { blinksToBad, holdBlink: setBlinksToBad };
}
