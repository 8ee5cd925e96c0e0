/** Where the section stands in the picture: the top left corner of its web, and pixels per mm. */
export interface Placement {
  readonly xPx: number;
  readonly yPx: number;
  readonly pxPerMm: number;
}
