/** A value an engine cannot compute with; `field` names it as the caller's input does. */
export class EngineInputError extends RangeError {
  readonly field: string;

  constructor(field: string, message: string) {
    super(message);
    this.field = field;
  }
}
