import { Controller, Get, Module } from '@nestjs/common';
import { readEnvironment } from '../../config/environment.js';
import { createApp } from '../../create-app.js';
import { registeredRoutes, routeComplaints } from './routes.js';

const nowhere = 'postgres://nobody@127.0.0.1:1/none';
const environment = readEnvironment({ MODE: 'test', DATABASE_URL: nowhere, DATABASE_JOBS_URL: nowhere });

@Controller('drain')
class OpenController {
  @Get()
  look(): string {
    return 'anybody';
  }
}

@Module({ controllers: [OpenController] })
class OpenModule {}

describe('the routes', () => {
  it('all say who may call them', async () => {
    const routes = registeredRoutes(await createApp(environment));
    expect(routeComplaints(routes)).toEqual([]);
    expect(routes).toContainEqual({
      method: 'GET',
      path: '/darkrooms/:darkroomId',
      handler: 'DarkroomsController.find',
      access: { kind: 'role', least: 'member' },
    });
  });

  it('that are open to anybody are these', async () => {
    const open = registeredRoutes(await createApp(environment)).filter(
      ({ access }) => access?.kind === 'public',
    );
    expect(open.map(({ method, path }) => `${method} ${path}`).sort()).toEqual([
      'GET /health',
      'GET /ready',
      'POST /sign-in',
      'POST /sign-in/refresh',
      'POST /sign-out',
    ]);
  });

  it('that do not say so keep the server from starting', async () => {
    await expect(createApp(environment, [OpenModule])).rejects.toThrow(
      'GET /drain (OpenController.look) does not say who may call it.',
    );
  });

  it('are refused when what they say does not fit their path', () => {
    const route = { method: 'GET', handler: 'X.y' };
    expect(
      routeComplaints([
        { ...route, path: '/bottles', access: { kind: 'role', least: 'member' } },
        { ...route, path: '/darkrooms/:darkroomId/bottles', access: { kind: 'signed-in' } },
        { ...route, path: '/unsubscribe/:secret', access: { kind: 'by-secret' } },
      ]),
    ).toEqual([
      'GET /bottles (X.y) asks for a role but names no darkroom.',
      'GET /darkrooms/:darkroomId/bottles (X.y) names a darkroom but asks for no role in it.',
    ]);
  });
});
