import type { Budget, PlanControl } from "../piece/strip-plan";

/** Counts the work of one plan against its budget and lets others have a turn between rounds. */
export class WorkMeter {
  patterns = 0;
  programmes = 0;
  nodes = 0;
  private rounds = 0;
  private halted = false;

  constructor(
    private readonly budget: Budget,
    private readonly control: PlanControl = {},
  ) {}

  get stopped(): boolean {
    return (this.halted ||= this.control.stopped?.() ?? false);
  }

  get spent(): boolean {
    return this.stopped || this.patterns >= this.budget.patterns || this.nodes >= this.budget.nodes;
  }

  get nodesLeft(): number {
    return Math.max(0, this.budget.nodes - this.nodes);
  }

  get patternsLeft(): number {
    return Math.max(0, this.budget.patterns - this.patterns);
  }

  say(done: number, sentence: string): void {
    this.control.progress?.({ done, sentence });
  }

  /** Gives the event loop a turn now and then, so that a stop can be heard; true when the work must end. */
  async pause(): Promise<boolean> {
    if (++this.rounds % 16 === 0) await new Promise<void>((resolve) => setTimeout(resolve, 0));
    return this.spent;
  }
}
