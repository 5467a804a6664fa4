import { addressRows } from './addresses.rows.js';
import { answersTopic } from './answers.cases.js';
import { bodyRows } from './bodies.rows.js';
import { bottleRows } from './bottles.rows.js';
import { countRows } from './counts.rows.js';
import { listRows } from './lists.rows.js';
import { mixingRows } from './mixing.rows.js';
import { mutantsTopic } from './mutants.cases.js';
import { orderRows } from './orders.rows.js';
import { receivingRows } from './receiving.rows.js';
import { requestRows } from './requests.rows.js';
import { table } from './table.js';
import { textRows } from './texts.rows.js';
import { timesTopic } from './times.cases.js';
import { timeRows } from './times.rows.js';
import { twiceTopic } from './twice.cases.js';
import { voidRows } from './voids.rows.js';
import { wholeTopic } from './whole.cases.js';
import { whoseTopic } from './whose.cases.js';
import { World } from './world.js';

let opened: World;
const world = () => opened;

beforeAll(async () => {
  opened = await World.open();
}, 60_000);

afterAll(() => opened?.close());

table('counts', world, countRows);
table('lists', world, listRows);
table('bodies', world, bodyRows);
table('keys, types and queries', world, requestRows);
table('addresses', world, addressRows);
table('texts', world, textRows);
table('moments and dates', world, timeRows);
table('mixing', world, mixingRows);
table('taking back', world, voidRows);
table('bottles that are not what they were', world, bottleRows);
table('orders', world, orderRows);
table('what comes of orders', world, receivingRows);
answersTopic(world);
whoseTopic(world);
twiceTopic(world);
wholeTopic(world);
timesTopic(world);
mutantsTopic(world);
