'use server';

import { refresh } from 'next/cache';
import { changeConditions, correctReading, voidDetermination } from '@/db/queries/determination-changes';
import {
  changeConditions as conditionsSchema,
  correctReading as correctionSchema,
  voidDetermination as voidSchema,
} from '@/lib/schemas/determination';
import { action } from '@/app/_server/action';

export const correct = action(correctionSchema, async (actor, input) => {
  await correctReading(actor, input);
  refresh();
  return { status: 'done' };
});

export const change = action(conditionsSchema, async (actor, input) => {
  await changeConditions(actor, input);
  refresh();
  return { status: 'done' };
});

export const declareVoid = action(voidSchema, async (actor, input) => {
  await voidDetermination(actor, input);
  refresh();
  return { status: 'done' };
});
