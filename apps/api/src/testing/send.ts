import type { NestExpressApplication } from '@nestjs/platform-express';
import request from 'supertest';

/** A request by the method's name, as routes tell it. */
export function send(app: NestExpressApplication, method: string, url: string): request.Test {
  const agent = request(app.getHttpServer());
  switch (method) {
    case 'GET':
      return agent.get(url);
    case 'PUT':
      return agent.put(url);
    case 'POST':
      return agent.post(url);
    case 'PATCH':
      return agent.patch(url);
    case 'DELETE':
      return agent.delete(url);
    default:
      throw new Error(`Nobody says how to send ${method}.`);
  }
}

/** An object without one of its keys. */
export const without = <T extends object>(whole: T, key: string): Partial<T> =>
  Object.fromEntries(Object.entries(whole).filter(([name]) => name !== key)) as Partial<T>;
