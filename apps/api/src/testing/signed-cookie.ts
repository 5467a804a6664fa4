import request from 'supertest';
import { PASSPHRASE, type TestApp } from './test-app.js';

/** The Cookie header that a browser would send after that answer. */
export function cookieAfter(answer: request.Response): string {
  const lines: unknown = answer.get('set-cookie');
  return (Array.isArray(lines) ? lines : []).map((line) => String(line).split(';')[0]).join('; ');
}

/** Signs that person in and keeps the cookies to send by hand. */
export async function signedCookie(t: TestApp, email: string): Promise<string> {
  const answer = await request(t.app.getHttpServer())
    .post('/api/sign-in')
    .set('sec-fetch-site', 'same-origin')
    .send({ email, passphrase: PASSPHRASE });
  if (answer.status !== 200) throw new Error(`Signing ${email} in was answered ${answer.status}.`);
  return cookieAfter(answer);
}
