import { delayS, networkOf } from './throttle-rules.js';

describe('the delay after wrong tries', () => {
  it('begins with the third, doubles, and never becomes a lock', () => {
    const delays = Array.from({ length: 16 }, (_, failures) => delayS(failures));
    expect(delays).toEqual([0, 0, 0, 1, 2, 4, 8, 16, 32, 64, 128, 256, 512, 900, 900, 900]);
    expect(delayS(5000)).toBe(900);
  });
});

describe('one network address', () => {
  it.each([
    ['192.0.2.7', '192.0.2.7'],
    ['::ffff:192.0.2.7', '192.0.2.7'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:0DB8:0001:0002::9', '2001:db8:1:2::/64'],
    ['2001:db8::1', '2001:db8:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
  ])('%s is counted as %s', (address, network) => {
    expect(networkOf(address)).toBe(network);
  });
});
