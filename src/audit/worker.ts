// The file that a worker thread loads; everything is in run-job.
export { default } from "./run-job.js";
