import path from 'node:path';
import { refusal, serverOnlyIn } from './layers.mjs';

const root = path.resolve(import.meta.dirname, '../../..');
const isServerOnly = serverOnlyIn(root);

/** Imports go one way; where one doesn't, the message says where the code should go. */
const oneWay = {
  meta: { type: 'problem', schema: [] },
  create(context) {
    const from = path.relative(root, context.filename).split(path.sep).join('/');
    const check = (node) => {
      if (typeof node.source?.value !== 'string') return;
      const to = projectPath(from, node.source.value);
      if (to === null) return;
      const typeOnly = node.importKind === 'type' || node.exportKind === 'type';
      const message = refusal(from, to, { typeOnly, isServerOnly });
      if (message) context.report({ node: node.source, message });
    };
    return {
      ImportDeclaration: check,
      ExportNamedDeclaration: check,
      ExportAllDeclaration: check,
      ImportExpression: check,
    };
  },
};

/** Of the project's own files; null for a package. */
function projectPath(from, specifier) {
  if (specifier.startsWith('@/')) return specifier.slice(2);
  if (specifier.startsWith('.')) return path.posix.join(path.posix.dirname(from), specifier);
  return null;
}

const plugin = { rules: { 'one-way-imports': oneWay } };

export default plugin;
