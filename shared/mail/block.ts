/** A number with its plain meaning under it. */
export interface FigureBlock {
  readonly value: string;
  readonly label: string;
  /** `alert` where somebody must act. */
  readonly tone: 'plain' | 'alert';
}

export interface TableColumn {
  readonly label: string;
  readonly numeric: boolean;
}

/** A line of a list; with an address it leads somewhere. */
export interface ListLine {
  readonly text: string;
  readonly href?: string;
}

/**
 * One piece of what a person reads. A letter and the page of the same content are made from the same
 * blocks, and so is a letter's text part, so that the three cannot say different things.
 */
export type Block =
  | { readonly kind: 'heading'; readonly text: string }
  | { readonly kind: 'paragraph'; readonly text: string }
  | { readonly kind: 'note'; readonly text: string }
  | { readonly kind: 'button'; readonly label: string; readonly href: string }
  | { readonly kind: 'figures'; readonly figures: readonly FigureBlock[] }
  | {
      readonly kind: 'table';
      readonly caption: string;
      readonly columns: readonly TableColumn[];
      readonly rows: readonly (readonly string[])[];
    }
  | { readonly kind: 'list'; readonly title: string; readonly lines: readonly ListLine[] };
