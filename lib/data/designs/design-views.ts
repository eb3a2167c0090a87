import type { BlockSize, Drawing, Role } from "@/lib/core/piece/drawing";
import type { AllowanceRules } from "@/lib/core/piece/strip-plan";
import type { CuttingRules } from "@/lib/core/piece/cut-piece";
import type { QuiltDesign } from "@/lib/core/piece/quilt-design";
import type { StoredQuilt } from "@/lib/input/quilt";

/** A block version as pages and quilts see it. */
export interface BlockVersionView {
  readonly versionId: number;
  readonly blockId: number;
  readonly slug: string;
  readonly name: string;
  readonly version: number;
  readonly traditional: boolean;
  readonly drawing: Drawing;
  readonly size: BlockSize;
  readonly roles: readonly Role[];
}

export interface BlockDraftView {
  readonly revision: number;
  readonly drawing: Drawing;
  readonly size: BlockSize;
  readonly roles: readonly Role[];
  /** ISO time. */
  readonly savedAt: string;
}

export interface QuiltVersionView {
  readonly versionId: number;
  readonly quiltId: number;
  readonly slug: string;
  readonly name: string;
  readonly version: number;
  readonly stored: StoredQuilt;
  /** With the drawings of its block versions. */
  readonly design: QuiltDesign;
  readonly size: BlockSize;
}

export interface KitNotion {
  readonly notionId: number;
  readonly count: number;
}

export interface KitVersionView {
  readonly versionId: number;
  readonly kitDesignId: number;
  readonly slug: string;
  readonly name: string;
  readonly version: number;
  readonly quiltVersionId: number;
  readonly format: "lengths" | "fat-quarters" | "pre-cut";
  readonly allowance: AllowanceRules;
  readonly rules: CuttingRules;
  readonly notions: readonly KitNotion[];
  readonly labourMinutes: number;
  /** Minor units. */
  readonly sheetCost: number;
  readonly smallParts: boolean;
}

export interface ColourwayView {
  readonly id: number;
  readonly kitVersionId: number;
  readonly name: string;
  /** Quilt role to fabric id. */
  readonly fabrics: Readonly<Record<string, number>>;
  /** Minor units. */
  readonly price: number;
  readonly onSale: boolean;
  /** Finds the plan that its lengths come from. */
  readonly planHash: string;
  readonly lengths: readonly { readonly fabricId: number; readonly cutLength: number; readonly plannedWidth: number }[];
}
