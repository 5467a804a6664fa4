// npm run build: compiles what changed.
import { build, buildHere } from './lib/build.mjs';
import { begin } from './lib/say.mjs';

await begin(process.argv.includes('--locked') ? buildHere : build);
