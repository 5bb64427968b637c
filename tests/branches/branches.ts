import ts from 'typescript';

/** A place in a file as coverage reports have it: line from 1, column from 0. */
export interface Place {
  readonly line: number;
  readonly column: number;
}

/** What a report says of one file, in the form that Istanbul defined. */
export interface FileReport {
  readonly path: string;
  readonly branchMap: Readonly<
    Record<
      string,
      {
        readonly type: string;
        readonly loc: { readonly start: Place };
        readonly locations: readonly { readonly start: Place }[];
      }
    >
  >;
  /** How often each arm of each branch was taken. */
  readonly b: Readonly<Record<string, readonly number[]>>;
}

export interface BranchCount {
  readonly taken: number;
  readonly all: number;
  /** Lines with an arm that no test takes. */
  readonly missed: readonly number[];
}

const key = ({ line, column }: Place): string => `${line}:${column}`;

const isUnknown = (node: ts.Expression): boolean =>
  (ts.isIdentifier(node) && node.text === 'NaN') ||
  (ts.isNumericLiteral(node) && node.text === '0');

/** `values[i]`: a place in a list, not a name in a record. */
const isPlaceInList = (node: ts.Expression): boolean =>
  ts.isElementAccessExpression(node) && !ts.isStringLiteralLike(node.argumentExpression);

/**
 * Where a file says `values[i] ?? NaN` or `values[i] ?? 0`. The compiler asks for the second arm of
 * every index; inside a list's own bounds no input takes it.
 */
export const indexFallbacks = (text: string): ReadonlySet<string> => {
  const source = ts.createSourceFile('file.ts', text, ts.ScriptTarget.ESNext, true);
  const found = new Set<string>();
  const visit = (node: ts.Node): void => {
    if (
      ts.isBinaryExpression(node) &&
      node.operatorToken.kind === ts.SyntaxKind.QuestionQuestionToken &&
      isPlaceInList(node.left) &&
      isUnknown(node.right)
    ) {
      const at = source.getLineAndCharacterOfPosition(node.getStart(source));
      found.add(key({ line: at.line + 1, column: at.character }));
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
};

/** Arms of a file's branches and how many the tests take; without the index fallbacks left out. */
export const branchesOf = (report: FileReport, leftOut: ReadonlySet<string>): BranchCount => {
  let taken = 0;
  let all = 0;
  const missed = new Set<number>();
  for (const [id, { type, loc, locations }] of Object.entries(report.branchMap)) {
    if (type === 'binary-expr' && leftOut.has(key(loc.start))) continue;
    for (const [arm, { start }] of locations.entries()) {
      all += 1;
      if ((report.b[id]?.[arm] ?? 0) > 0) taken += 1;
      else missed.add(start.line);
    }
  }
  return { taken, all, missed: [...missed].toSorted((a, b) => a - b) };
};
