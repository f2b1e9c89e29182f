import { startSentence } from "./start-sentence.ts";

// Loaded here, so that a wrong environment is told in one sentence and not as a trace.
try {
  const { serve } = await import("./serve.ts");
  await serve();
} catch (error) {
  process.stderr.write(`${startSentence(error)}\n`);
  process.exit(1);
}
