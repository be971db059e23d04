import path from "node:path";
import { CLIENT_FOLDERS, DATABASE_PACKAGES } from "./direction.mjs";

/** @typedef {import("./direction.mjs").Zone} Zone */

/** @param {string} file @param {Zone[]} zones */
function zoneOf(file, zones) {
  return zones
    .filter((zone) => file === zone.path || file.startsWith(`${zone.path}/`))
    .sort((left, right) => right.path.length - left.path.length)[0];
}

/** Path of an import inside the project, or null for a package. @param {string} source @param {string} from */
function projectPath(source, from) {
  if (source.startsWith("@/")) return source.slice(2);
  if (source.startsWith(".")) return path.posix.normalize(path.posix.join(path.posix.dirname(from), source));
  return null;
}

/** @param {string} source */
function packageName(source) {
  const parts = source.replace(/^node:/, "").split("/");
  return source.startsWith("@") ? parts.slice(0, 2).join("/") : (parts[0] ?? source);
}

/** @param {Zone} own @param {string} source */
function packageComplaint(own, source) {
  const name = packageName(source);
  if (own.path === "app" && DATABASE_PACKAGES.includes(name))
    return `app never touches ${name}: call a service.`;
  if (own.packages === "any" || own.packages === undefined) return null;
  return own.packages.includes(name)
    ? null
    : `${own.path} imports no package but ${own.packages.join(", ") || "none"}.`;
}

/** @param {Zone} own @param {string} target @param {Zone[]} zones @param {boolean} isClient */
function pathComplaint(own, target, zones, isClient) {
  const other = zoneOf(target, zones);
  if (!other) return null;
  if (isClient && !CLIENT_FOLDERS.includes(other.path)) return `A client file can't import ${other.path}.`;
  if (own.path === "app" && other.path === "db") return "app never touches db: call a service.";
  if (other.path === own.path || other.rank < own.rank || own.beside?.includes(other.path)) return null;
  return `${own.path} (rank ${own.rank}) can't import ${other.path} (rank ${other.rank}).`;
}

/** @type {import("eslint").Rule.RuleModule} */
const direction = {
  meta: { type: "problem", schema: [{ type: "array" }], messages: { wrong: "{{why}}" } },
  create(context) {
    const zones = /** @type {Zone[]} */ (context.options[0]);
    const file = path.relative(context.cwd, context.filename).split(path.sep).join("/");
    const own = zoneOf(file, zones);
    if (!own) return {};
    let isClient = false;
    /** @param {import("estree").Node} node @param {unknown} source */
    const check = (node, source) => {
      if (typeof source !== "string") return;
      const target = projectPath(source, file);
      const why =
        target === null ? packageComplaint(own, source) : pathComplaint(own, target, zones, isClient);
      if (why) context.report({ node, messageId: "wrong", data: { why } });
    };
    return {
      Program(node) {
        isClient = node.body.some((each) => "directive" in each && each.directive === "use client");
      },
      ImportDeclaration: (node) => check(node, node.source.value),
      ExportAllDeclaration: (node) => check(node, node.source.value),
      ExportNamedDeclaration: (node) => check(node, node.source?.value),
      ImportExpression: (node) => check(node, node.source.type === "Literal" ? node.source.value : null),
    };
  },
};

/**
 * A verb that opens a transaction decides who may and writes the audit. Exempt are files that say why with
 * `withBookkeeping`, and parts that take a transaction already opened.
 * @type {import("eslint").Rule.RuleModule}
 */
const guardedTransaction = {
  meta: {
    type: "problem",
    schema: [],
    messages: {
      unguarded: "A file that calls withTransaction calls requireAction or authorize, and writeAudit.",
    },
  },
  create(context) {
    const called = new Set();
    /** @type {import("estree").Node | null} */
    let opened = null;
    return {
      CallExpression(node) {
        if (node.callee.type !== "Identifier") return;
        called.add(node.callee.name);
        if (node.callee.name === "withTransaction") opened = node;
      },
      "Program:exit"() {
        const isGuarded = called.has("requireAction") || called.has("authorize");
        if (opened && !(isGuarded && called.has("writeAudit"))) {
          context.report({ node: opened, messageId: "unguarded" });
        }
      },
    };
  },
};

/** An update or delete without `where` touches every row. @type {import("eslint").Rule.RuleModule} */
const whereOnWrite = {
  meta: { type: "problem", schema: [], messages: { missing: "Say which rows: .where(...) is missing." } },
  create(context) {
    return {
      CallExpression(node) {
        if (node.callee.type !== "MemberExpression" || node.callee.property.type !== "Identifier") return;
        const { name } = node.callee.property;
        const isUpdate = name === "set";
        const target = node.callee.object;
        const isDelete =
          name === "delete" &&
          target.type === "MemberExpression" &&
          "name" in target.property &&
          target.property.name === "db";
        const updates =
          isUpdate &&
          target.type === "CallExpression" &&
          target.callee.type === "MemberExpression" &&
          "name" in target.callee.property &&
          target.callee.property.name === "update";
        if (!updates && !isDelete) return;
        const { parent } = /** @type {import("eslint").Rule.Node} */ (node);
        const hasWhere =
          parent?.type === "MemberExpression" &&
          "name" in parent.property &&
          parent.property.name === "where";
        if (!hasWhere) context.report({ node, messageId: "missing" });
      },
    };
  },
};

export const houseRules = {
  rules: { direction, "guarded-transaction": guardedTransaction, "where-on-write": whereOnWrite },
};
