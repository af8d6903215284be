// Starts the parsing thread from TypeScript source, in development and in tests. A built program starts
// dist/processes/lesson-text-worker.mjs instead (see thread-entry.ts).
import { register } from 'tsx/esm/api';

register();
await import('../../processes/lesson-text-worker.ts');
