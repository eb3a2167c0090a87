import { useId } from "react";
import type { ReactNode } from "react";
import type { ClothTile } from "./cloth";
import { ClothPattern } from "./cloth-patterns";

interface SwatchProps {
  /** Null where nothing is chosen. */
  readonly fabric: Omit<ClothTile, "id"> | null;
  /** The fabric's name, where no text beside the swatch says it. */
  readonly label?: string;
  readonly width?: number;
  readonly height?: number;
}

/** A piece of the fabric with pinked long edges; a dashed outline where nothing is chosen. It carries its own pattern. */
export function Swatch({ fabric, label, width = 44, height = 33 }: SwatchProps) {
  const id = `swatch-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const said = label ? { role: "img", "aria-label": label } : { "aria-hidden": true };
  if (!fabric) return <span className="swatch-blank" style={{ width, height }} {...said} />;
  const outline = pinked(width, height);
  return (
    <svg className="swatch" width={width} height={height} viewBox={`0 0 ${width} ${height}`} {...said}>
      <defs>
        <ClothPattern id={id} fabric={{ id, ...fabric }} />
      </defs>
      <path d={outline} fill={`url(#${id})`} />
      <path d={outline} fill="none" stroke="var(--walnut)" strokeOpacity=".28" />
    </svg>
  );
}

/** Teeth of 2 px on the long edges; the width is taken down to whole teeth, so that both corners match. */
export function pinked(width: number, height: number): string {
  const teeth = Math.max(1, Math.floor(width / 4)) * 2;
  const tooth = width / teeth;
  const top = Array.from({ length: teeth + 1 }, (_, index) => `${round(index * tooth)} ${index % 2 === 0 ? 2 : 0}`);
  const foot = Array.from({ length: teeth + 1 }, (_, index) => `${round(width - index * tooth)} ${index % 2 === 0 ? height - 2 : height}`);
  return `M${top.join("L")}L${foot.join("L")}Z`;
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}

/** A swatch with the fabric's name under it. */
export function SwatchChip({ fabric, children }: { fabric: SwatchProps["fabric"]; children: ReactNode }) {
  return (
    <span className="swatch-chip">
      <Swatch fabric={fabric} width={64} height={44} />
      <span>{children}</span>
    </span>
  );
}

/** A colour family or a fabric with its word beside it, in one line. */
export function SwatchWord({ fabric, children }: { fabric: SwatchProps["fabric"]; children: ReactNode }) {
  return (
    <span className="swatch-word">
      <Swatch fabric={fabric} width={32} height={24} />
      {children}
    </span>
  );
}
