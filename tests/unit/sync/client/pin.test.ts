import { expect, test } from 'vitest';
import { choosePin, NO_LOCK, parseLock, tryPin } from '@/lib/sync/client/pin';

test('the PIN opens; what is stored does not tell it, and differs each time', async () => {
  const lock = { ...(await choosePin('2580')), locked: true };
  expect(JSON.stringify(lock)).not.toContain('2580');
  expect((await choosePin('2580')).hash).not.toBe(lock.hash);
  expect(await tryPin(lock, '2580', 0)).toMatchObject({ locked: false, wrong: 0 });
});

test('wrong PINs delay, longer each time from the third on to two minutes, and lose nothing', async () => {
  let lock = { ...(await choosePin('2580')), locked: true };
  const waits: number[] = [];
  for (let count = 0; count < 10; count += 1) {
    lock = await tryPin(lock, '0000', 0);
    waits.push(lock.waitUntil / 1000);
  }
  expect(waits).toEqual([0, 0, 2, 4, 8, 16, 32, 64, 120, 120]);
  expect(await tryPin(lock, '2580', 0)).toMatchObject({ locked: false, wrong: 0, waitUntil: 0 });
});

test('a store that holds no lock, or a broken one, is not locked', () => {
  expect(parseLock(undefined)).toEqual(NO_LOCK);
  expect(parseLock({ hash: 7 })).toEqual(NO_LOCK);
});
