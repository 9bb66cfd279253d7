import type { Tone } from '@/components/ui/pill';
import type { FlagLevel } from '@/lib/engine';

export const FLAG_TONE: Readonly<Record<FlagLevel, Tone>> = { note: 'note', warn: 'decide', stop: 'stop' };
