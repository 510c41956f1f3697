/** What the intake needs of a study; the study file's own type satisfies it. */
export interface ColumnChoice {
  readonly column: string;
  readonly unit?: string | undefined;
}

export interface IntakeStudy {
  readonly inventory: {
    readonly file: string;
    readonly encoding: string;
    readonly delimiter: string;
    readonly decimal: string;
    readonly blank: readonly string[];
    /** Ours: theirs. */
    readonly columns: Readonly<Record<string, string | ColumnChoice | undefined>>;
    readonly merge_rows_by?: string | undefined;
    readonly no_building?: { readonly column: string; readonly values: readonly string[] } | undefined;
  };
  readonly neighbours?: { readonly file: string } | undefined;
  readonly words: Readonly<Record<string, Readonly<Record<string, string>> | undefined>>;
}
