/** What long work says of itself while it goes on. */
export interface ScreenProgress {
  readonly step: string;
  /** Share done of a step that can tell, else NaN. */
  readonly share: number;
}
