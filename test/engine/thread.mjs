// A thread of Node knows no TypeScript by itself, even where its parent does.
import { register } from 'tsx/esm/api';

register();
await import('./thread.ts');
