/** `npm run audit:verify`: walks every audit chain where the product runs. */
import { runInPlace } from './setup/place.mjs';
import { endWith } from './setup/say.mjs';

runInPlace('audit-verify', process.argv.slice(2)).then((code) => process.exit(code), endWith);
