import path from 'node:path';
import ts from 'typescript';
import { expect, it } from 'vitest';
import { codeFile, projectFiles, textOf } from './tracked-files.ts';

/** The files a file imports when it runs; imports of types vanish before that. */
function runtimeImports(file: string): string[] {
  const source = ts.createSourceFile(file, textOf(file) ?? '', ts.ScriptTarget.Latest, false);
  return source.statements.flatMap((statement) => {
    if (!ts.isImportDeclaration(statement) && !ts.isExportDeclaration(statement)) return [];
    if (ts.isImportDeclaration(statement) ? isTypesOnly(statement) : statement.isTypeOnly) return [];
    const { moduleSpecifier } = statement;
    if (!moduleSpecifier || !ts.isStringLiteral(moduleSpecifier)) return [];
    const { text } = moduleSpecifier;
    if (text.startsWith('#')) return [text.slice(1)];
    return text.startsWith('.') ? [path.posix.join(path.posix.dirname(file), text)] : [];
  });
}

function isTypesOnly({ importClause }: ts.ImportDeclaration): boolean {
  return importClause?.phaseModifier === ts.SyntaxKind.TypeKeyword;
}

/** Every circle found by walking the imports, each once, written from its first file. */
export function findCycles(imports: ReadonlyMap<string, readonly string[]>): string[] {
  const finished = new Set<string>();
  const cycles = new Set<string>();
  const trail: string[] = [];
  const walk = (file: string): void => {
    const seenAt = trail.indexOf(file);
    if (seenAt >= 0) {
      cycles.add([...trail.slice(seenAt), file].join(' -> '));
      return;
    }
    if (finished.has(file)) return;
    trail.push(file);
    for (const next of imports.get(file) ?? []) walk(next);
    trail.pop();
    finished.add(file);
  };
  for (const file of imports.keys()) walk(file);
  return [...cycles];
}

it('finds a circle of three and only that', () => {
  const imports = new Map([
    ['a', ['b', 'd']],
    ['b', ['c']],
    ['c', ['a', 'd']],
    ['d', []],
  ]);
  expect(findCycles(imports)).toEqual(['a -> b -> c -> a']);
});

it('has no circle of imports', () => {
  const imports = new Map(projectFiles(codeFile).map((file) => [file, runtimeImports(file)]));
  expect(imports.size).toBeGreaterThan(50);
  expect(findCycles(imports)).toEqual([]);
});
