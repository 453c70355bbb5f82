/** A statement with its values, as pg takes it; a name makes it a prepared one. */
export interface Statement {
  readonly name?: string | undefined;
  readonly text: string;
  readonly values?: unknown[] | undefined;
}

export type BarePage =
  | {
      readonly kind: 'list';
      readonly statement: Statement;
      readonly before: readonly Statement[];
      readonly limit: number;
    }
  | {
      readonly kind: 'thread';
      readonly statement: Statement;
      readonly before: readonly Statement[];
      readonly lastSequence: number;
    };

interface BareSettings {
  readonly port: number;
  /** A folder of its own. */
  readonly folder: string;
}

export interface BarePageSettings extends BareSettings {
  readonly databaseUrl: string;
  readonly pages: Readonly<Record<string, BarePage>>;
}

export interface BarePostSettings extends BareSettings {
  readonly databaseUrl: string;
}

export type BareUploadSettings = BareSettings;
export type BareSocketSettings = BareSettings;
