import { workerData } from "piscina";
import { register } from "tsx/esm/api";

// A thread does not inherit what lets this process read TypeScript. This registers it and hands over to the worker that
// the pool names. Built, each worker is a file of its own and this one is not used.
register();
const { default: run } = await import(`./${workerData}.node.ts`);

export default run;
