/** The mark: a woven square, a lens, the weave larger in the lens. One colour, never below 16 pixels. */
interface MarkProps {
  size: number;
  colour: string;
}

export function Mark({ size, colour }: MarkProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 32 32"
      fill="none"
      stroke={colour}
      role="img"
      aria-label="Pickglass"
      style={{ flex: 'none', display: 'block' }}
    >
      <circle cx={16} cy={16} r={10} strokeWidth={2} />
      <path strokeWidth={4} d="M10 13V19M16 6V13M16 19V26M22 13V19M8 10H13M19 10H24M13 16H19M8 22H13M19 22H24" />
      <path
        strokeWidth={1.8}
        d="M3 5.2V13.8M3 18.2V26.8M9.5 0V5.7M9.5 26.3V32M22.5 0V5.7M22.5 26.3V32M29 5.2V13.8M29 18.2V26.8M0 3H7.3M11.7 3H20.3M24.7 3H32M0 16H3.8M28.2 16H32M0 29H7.3M11.7 29H20.3M24.7 29H32"
      />
    </svg>
  );
}
