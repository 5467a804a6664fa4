import { cookieName, cookieOptions } from './cookies.js';

describe('cookies', () => {
  it('are held to the host by the browser where people come by https', () => {
    expect(cookieName('access', 'https://darkroom.example')).toBe('__Host-wetside-access');
    expect(cookieOptions('https://darkroom.example')).toEqual({
      httpOnly: true,
      sameSite: 'lax',
      path: '/',
      secure: true,
    });
  });

  it('carry the port on localhost, where all ports share one jar', () => {
    expect(cookieName('refresh', 'http://localhost:3000')).toBe('wetside-refresh-3000');
    expect(cookieName('refresh', 'http://localhost')).toBe('wetside-refresh-80');
    expect(cookieOptions('http://localhost:3000').secure).toBe(false);
  });
});
