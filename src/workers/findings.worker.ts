import { expose } from 'comlink';
import { createFindingsEngine } from '#src/lib/findings/findings-engine.ts';

expose(createFindingsEngine());
