/** Remembers the answer to the last question: one picture is asked for by stage, nodes and glass. */
export const lastOnly = <In, Out>(work: (input: In) => Out): ((input: In) => Out) => {
  let last: { input: In; output: Out } | null = null;
  return (input) => {
    if (!last || last.input !== input) last = { input, output: work(input) };
    return last.output;
  };
};
