/** The worker's way in: everything that sees record numbers, dates and the opened key. */
import type { ToWorker } from './protocol.ts';
import { serve } from './serve.ts';
import { workshop } from './workshop.ts';

const scope = self as unknown as DedicatedWorkerGlobalScope;
const take = serve(workshop(), (message, transfer) => scope.postMessage(message, transfer));
scope.addEventListener('message', ({ data }: MessageEvent<ToWorker>) => take(data));
