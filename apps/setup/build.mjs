// `npm run build`: everything that must stand ready before a command of dist/ runs.
import { prepare } from './steps.mjs';

await prepare();
