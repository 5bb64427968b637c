import ts from 'typescript';

export const KINDS = ['sign', 'side', 'degrees', 'off-by-one'] as const;
export type Kind = (typeof KINDS)[number];

/** One small fault that can be put into a file: `before` at `start` becomes `after`. */
export interface Mutant {
  /** Path from the root of the repository. */
  readonly file: string;
  readonly kind: Kind;
  /** Line number from 1, and what stands on it. */
  readonly line: number;
  readonly code: string;
  readonly start: number;
  readonly before: string;
  readonly after: string;
}

/** An operator or name in its place, and what it is exchanged for. */
interface Change {
  readonly kind: Kind;
  readonly start: number;
  readonly end: number;
  readonly after: string;
}

const OTHER_OPERATOR: ReadonlyMap<ts.SyntaxKind, readonly [Kind, string]> = new Map([
  [ts.SyntaxKind.PlusToken, ['sign', '-']],
  [ts.SyntaxKind.MinusToken, ['sign', '+']],
  [ts.SyntaxKind.PlusEqualsToken, ['sign', '-=']],
  [ts.SyntaxKind.MinusEqualsToken, ['sign', '+=']],
  [ts.SyntaxKind.LessThanToken, ['off-by-one', '<=']],
  [ts.SyntaxKind.LessThanEqualsToken, ['off-by-one', '<']],
  [ts.SyntaxKind.GreaterThanToken, ['off-by-one', '>=']],
  [ts.SyntaxKind.GreaterThanEqualsToken, ['off-by-one', '>']],
]);

const SLICING = new Set(['slice', 'subarray', 'at']);

/** The same word for the other side of the body or of the picture; null where it names none. */
export const otherSideOf = (word: string): string | null => {
  const pairs: readonly (readonly [RegExp, string])[] = [
    [/(^|-)left$/, '$1right'],
    [/(^|-)right$/, '$1left'],
    [/-support$/, '-lifted'],
    [/-lifted$/, '-support'],
    [/^lifted-side$/, 'support-side'],
    [/^support-side$/, 'lifted-side'],
  ];
  for (const [side, other] of pairs) if (side.test(word)) return word.replace(side, other);
  return null;
};

const isText = (node: ts.Expression): boolean =>
  ts.isStringLiteralLike(node) || ts.isTemplateExpression(node);

/** 180/π and π/180 as they are written out. */
const isDegreesFactor = ({ left, right }: ts.BinaryExpression, source: ts.SourceFile): boolean => {
  const words = [left.getText(source), right.getText(source)];
  return words.includes('180') && words.includes('Math.PI');
};

function* changesOf(node: ts.Node, source: ts.SourceFile): Generator<Change> {
  const replace = (part: ts.Node, kind: Kind, after: string): Change => ({
    kind,
    start: part.getStart(source),
    end: part.end,
    after,
  });
  const oneFurther = (index: ts.Expression): Change =>
    replace(index, 'off-by-one', `(${index.getText(source)}) + 1`);

  if (ts.isBinaryExpression(node)) {
    const other = OTHER_OPERATOR.get(node.operatorToken.kind);
    if (other && !isText(node.left) && !isText(node.right))
      yield replace(node.operatorToken, ...other);
    if (node.operatorToken.kind === ts.SyntaxKind.SlashToken && isDegreesFactor(node, source))
      yield replace(
        node,
        'degrees',
        `${node.right.getText(source)} / ${node.left.getText(source)}`,
      );
  } else if (ts.isPrefixUnaryExpression(node) && node.operator === ts.SyntaxKind.MinusToken) {
    yield replace(node, 'sign', node.operand.getText(source));
  } else if (ts.isStringLiteral(node)) {
    const other = otherSideOf(node.text);
    if (other) yield replace(node, 'side', `'${other}'`);
  } else if (ts.isElementAccessExpression(node) && !isText(node.argumentExpression)) {
    yield oneFurther(node.argumentExpression);
  } else if (ts.isCallExpression(node)) {
    const [first] = node.arguments;
    const callee = node.expression;
    if (first && ts.isIdentifier(callee)) {
      if (callee.text === 'toDegrees' || callee.text === 'toRadians')
        yield replace(node, 'degrees', `(${first.getText(source)})`);
      if (callee.text === 'otherSide') yield replace(node, 'side', first.getText(source));
    }
    if (ts.isPropertyAccessExpression(callee) && SLICING.has(callee.name.text))
      for (const bound of node.arguments) yield oneFurther(bound);
  } else if (ts.isForStatement(node) && node.initializer) {
    if (ts.isVariableDeclarationList(node.initializer))
      for (const { initializer } of node.initializer.declarations)
        if (initializer && ts.isNumericLiteral(initializer)) yield oneFurther(initializer);
  }
}

/**
 * Every mutant of a file: a changed sign, side, unit of angle, or count. Types, imports and the step
 * of a `for` are left alone: they change nothing at run time, or never end.
 */
export const mutantsOf = (file: string, text: string): readonly Mutant[] => {
  const source = ts.createSourceFile(file, text, ts.ScriptTarget.ESNext, true, ts.ScriptKind.TS);
  const lines = text.split('\n');
  const mutants: Mutant[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node) || ts.isTypeNode(node)) return;
    if (ts.isInterfaceDeclaration(node) || ts.isTypeAliasDeclaration(node)) return;
    if (ts.isForStatement(node.parent ?? node) && 'incrementor' in node.parent)
      if (node.parent.incrementor === node) return;
    for (const { kind, start, end, after } of changesOf(node, source)) {
      const { line } = source.getLineAndCharacterOfPosition(start);
      mutants.push({
        file,
        kind,
        line: line + 1,
        code: lines[line]?.trim() ?? '',
        start,
        before: text.slice(start, end),
        after,
      });
    }
    ts.forEachChild(node, visit);
  };
  ts.forEachChild(source, visit);
  return mutants;
};

/** The file's text with the fault in it. */
export const applied = (text: string, { start, before, after }: Mutant): string =>
  text.slice(0, start) + after + text.slice(start + before.length);
