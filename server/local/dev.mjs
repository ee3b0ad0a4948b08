// Development: API and rendering from the TypeScript, started anew on every change, and the pages by the dev server.
import { launch } from './start/launch.mjs';

process.exitCode = await launch(process.env, { compiled: false });
