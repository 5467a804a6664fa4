// Says what real use lacks, before anything is installed or built.
import { refuseUnready } from './real.mjs';
import { begin } from './say.mjs';

await begin(async () => refuseUnready());
