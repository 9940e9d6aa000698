/** `npm run reassess -- --check`: recomputes every stored assessment where the product runs. */
import { runInPlace } from './setup/place.mjs';
import { endWith } from './setup/say.mjs';

runInPlace('reassess', process.argv.slice(2)).then((code) => process.exit(code), endWith);
