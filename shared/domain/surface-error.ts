/** What is wrong with a description of a surface; `field` is the part of the input it is about. */
export class SurfaceError extends Error {
  readonly field: string;
  readonly code: string;

  constructor(field: string, message: string, code = 'surface') {
    super(message);
    this.name = 'SurfaceError';
    this.field = field;
    this.code = code;
  }
}
