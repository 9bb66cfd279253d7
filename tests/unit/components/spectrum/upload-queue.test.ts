import { describe, expect, test } from 'vitest';
import { verdictOf } from '@/components/spectrum/send-upload';
import { createUploadQueue, type SendUpload, type UploadVerdict } from '@/components/spectrum/upload-queue';

const files = (n: number) => Array.from({ length: n }, (_, i) => new File(['x'], `S${i + 1}.jdx`));
const refused: UploadVerdict = { verdict: 'refused', sentence: 'no', line: 3 };
const asks: UploadVerdict = { verdict: 'asks', shape: 'two columns', questions: [] };
const tick = () => new Promise((resolve) => setTimeout(resolve, 0));

/** A sender whose answers the test gives one by one. */
function heldSender() {
  const held: {
    name: string;
    answer: (verdict: UploadVerdict) => void;
    signal: AbortSignal;
    options: object;
  }[] = [];
  const send: SendUpload = (file, options, _onSent, signal) =>
    new Promise((answer) => held.push({ name: file.name, answer, signal, options }));
  return { held, send };
}

describe('the upload queue', () => {
  test('sends three at a time, in order, each with its verdict; one bad file stops no other', async () => {
    const { held, send } = heldSender();
    const queue = createUploadQueue(send);
    queue.add(files(5));
    expect(held.map((call) => call.name)).toEqual(['S1.jdx', 'S2.jdx', 'S3.jdx']);
    held[1]?.answer(refused);
    await tick();
    expect(held.map((call) => call.name)).toEqual(['S1.jdx', 'S2.jdx', 'S3.jdx', 'S4.jdx']);
    expect(queue.snapshot().map((item) => item.verdict?.verdict)).toEqual([
      undefined,
      'refused',
      undefined,
      undefined,
      undefined,
    ]);
  });

  test('takes 500 files and not 501', () => {
    const { held, send } = heldSender();
    const queue = createUploadQueue(send);
    expect(queue.add(files(501))).toContain('501 files; 500 go at a time');
    expect(held).toHaveLength(0);
    expect(queue.add(files(500))).toBeNull();
    expect(queue.snapshot()).toHaveLength(500);
  });

  test('one answer serves every file of the shape, those that ask later too', async () => {
    const { held, send } = heldSender();
    const queue = createUploadQueue(send);
    queue.add(files(3));
    held[0]?.answer(asks);
    held[1]?.answer(asks);
    await tick();
    const [first] = queue.snapshot();
    queue.answer(first?.key ?? 0, { decimalMark: ',' });
    expect(held.slice(3).map((call) => [call.name, call.options])).toEqual([
      ['S1.jdx', { decimalMark: ',' }],
      ['S2.jdx', { decimalMark: ',' }],
    ]);
    held[2]?.answer(asks);
    await tick();
    expect(held.at(-1)).toMatchObject({ name: 'S3.jdx', options: { decimalMark: ',' } });
    held.at(-1)?.answer(asks); // the answer did not help: it is not given for ever
    await tick();
    expect(queue.snapshot()[2]?.verdict).toEqual(asks);
  });

  test('stop ends what is on its way and sends nothing more; trying again sends it', async () => {
    const { held, send } = heldSender();
    const queue = createUploadQueue(send);
    queue.add(files(4));
    queue.cancel();
    expect(held.every((call) => call.signal.aborted)).toBe(true);
    held.forEach((call) => call.answer({ verdict: 'cancelled' }));
    await tick();
    expect(held).toHaveLength(3);
    queue.retry();
    expect(held).toHaveLength(6);
  });
});

describe('verdictOf', () => {
  test.each([
    [
      422,
      { code: 'X', detail: 'bad', errors: [{ pointer: '/file/line/12' }] },
      { verdict: 'refused', sentence: 'bad', line: 12 },
    ],
    [413, { code: 'TOO_LARGE', detail: 'large' }, { verdict: 'refused', sentence: 'large', line: null }],
    [
      403,
      { code: 'NOT_ALLOWED', detail: 'look only' },
      { verdict: 'refused', sentence: 'look only', line: null },
    ],
    [500, null, { verdict: 'failed', sentence: expect.stringContaining('Try again') }],
    [
      401,
      { code: 'NOT_SIGNED_IN', detail: 'x' },
      { verdict: 'failed', sentence: expect.stringContaining('Sign in') },
    ],
    [
      409,
      { code: 'QUESTION', detail: 'x', shape: 's', questions: [] },
      { verdict: 'asks', shape: 's', questions: [] },
    ],
  ])('%i %j', (status, body, expected) => {
    expect(verdictOf(status, body)).toEqual(expected);
  });
});
