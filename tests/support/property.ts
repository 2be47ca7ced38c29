/** fast-check with the same cases at every run, so that a failure today is one tomorrow. */
import fc from "fast-check";

fc.configureGlobal({ seed: 20260301 });

export default fc;
