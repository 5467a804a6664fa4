import { onlineManager } from '@tanstack/react-query';
import { NetworkError } from '../api/problem.js';

/**
 * What was asked for, or NetworkError as soon as the device has no signal: a form that waits must not wait for that.
 * What is on its way meanwhile goes on under its own id once the signal is back.
 */
export function orNoSignal<T>(ask: () => Promise<T>): Promise<T> {
  if (!onlineManager.isOnline()) return Promise.reject(new NetworkError('no signal'));
  return new Promise<T>((resolve, reject) => {
    const stop = onlineManager.subscribe((online) => {
      if (!online) reject(new NetworkError('no signal'));
    });
    ask().then(resolve, reject).finally(stop);
  });
}
