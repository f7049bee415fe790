/** What every part has, whatever its kind: name, box, mass, price. */

/** A price that holds from a number of pieces on. */
export interface PriceBreak {
  /** Smallest number of pieces, from 1. */
  readonly from: number;
  /** Price of one piece in the table's currency. */
  readonly price: number;
}

/** Columns that every parts table shares. SI base units. */
export interface Part {
  readonly name: string;
  /** Box of the part, m. */
  readonly length: number;
  readonly width: number;
  readonly height: number;
  /** kg. */
  readonly mass: number;
  /** At least one, by rising `from`. */
  readonly prices: readonly PriceBreak[];
  /** Three letters of the prices' currency, where the row came from a table. */
  readonly currency?: string;
  /** Pieces in stock, where the table says. */
  readonly stock?: number;
}
