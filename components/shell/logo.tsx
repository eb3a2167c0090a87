interface LogoProps {
  readonly height?: number;
  readonly on?: "paper" | "rod";
  readonly className?: string;
}

/** The name, its two l's being rods. */
export function Logo({ height = 30, on = "paper", className }: LogoProps) {
  const width = Math.round((height * 222.1) / 64);
  return (
    <svg className={className} width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label="Ellwand">
      <image href={on === "rod" ? "/brand/ellwand-on-rod.svg" : "/brand/ellwand.svg"} width={width} height={height} />
    </svg>
  );
}
