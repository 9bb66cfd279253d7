export type FlagLevel = 'note' | 'warn' | 'stop';

export interface Flag {
  readonly code: FlagCode;
  readonly level: FlagLevel;
  readonly message: string;
  readonly value?: number;
  readonly limit?: number;
}

export type FlagCode = string;
