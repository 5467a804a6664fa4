// One small GET on three floors, to say what a framework costs: node:http, Express, Nest on Express.
// node scripts/floor/ladder.mjs http | express | nest PORT
import { createServer } from 'node:http';

const [floor = '', port = ''] = process.argv.slice(2);
const listenAt = /** @type {const} */ ([Number(port), '127.0.0.1']);
const answer = { status: 'ok' };

if (floor === 'http') {
  createServer((_, response) => {
    response
      .writeHead(200, { 'content-type': 'application/json; charset=utf-8' })
      .end(JSON.stringify(answer));
  }).listen(...listenAt);
} else if (floor === 'express') {
  const { default: express } = await import('express');
  const app = express();
  app.use(express.json());
  app.get('/', (_, response) => void response.json(answer));
  app.listen(...listenAt);
} else if (floor === 'nest') {
  await import('reflect-metadata');
  const { Controller, Get, Module } = await import('@nestjs/common');
  const { NestFactory } = await import('@nestjs/core');
  class RootController {
    one() {
      return answer;
    }
  }
  const one = Object.getOwnPropertyDescriptor(RootController.prototype, 'one') ?? {};
  Controller()(RootController);
  Get()(RootController.prototype, 'one', one);
  class RootModule {}
  Module({ controllers: [RootController] })(RootModule);
  const app = await NestFactory.create(RootModule, { logger: false });
  await app.listen(...listenAt);
} else {
  throw new Error(`There is no floor ${floor}.`);
}
