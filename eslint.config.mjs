import next from "eslint-config-next/core-web-vitals";
import { importX } from "eslint-plugin-import-x";
import tseslint from "typescript-eslint";
import { directionZones } from "./lib/config/lint/direction.mjs";
import { houseRules } from "./lib/config/lint/house-rules.mjs";

const ROLE_NAMES = ["ward_nurse", "infection_control", "board_member", "quality_lead"];

const noRoleNames = {
  selector: `Literal[value=/^(${ROLE_NAMES.join("|")})$/]`,
  message: "Only lib/policy knows roles: ask can() or authorize().",
};
const noProcessEnv = {
  selector: "MemberExpression[object.name='process'][property.name='env']",
  message: "Only lib/config/env.ts reads the environment.",
};
const noServerActions = {
  selector: "Directive[value='use server'], ExpressionStatement > Literal[value='use server']",
  message: "There are no server actions: forms use the API's routes.",
};

export default tseslint.config(
  {
    ignores: [
      ".next/**",
      "node_modules/**",
      ".data/**",
      ".shots/**",
      "coverage/**",
      "tests/.tmp/**",
      "next-env.d.ts",
    ],
  },
  ...next,
  {
    files: ["**/*.{ts,tsx}"],
    extends: [tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-floating-promises": "error",
      "@typescript-eslint/switch-exhaustiveness-check": [
        "error",
        { considerDefaultExhaustiveForUnions: true },
      ],
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "inline-type-imports" }],
      "@typescript-eslint/no-misused-promises": ["error", { checksVoidReturn: { attributes: false } }],
      "@typescript-eslint/require-await": "off",
    },
  },
  {
    files: ["**/*.{ts,tsx,mjs}"],
    plugins: { "import-x": importX, house: houseRules },
    settings: {
      "import-x/resolver": { typescript: { project: import.meta.dirname }, node: true },
      "import-x/extensions": [".ts", ".tsx", ".mjs"],
      "import-x/parsers": { "@typescript-eslint/parser": [".ts", ".tsx"] },
    },
    rules: {
      "import-x/no-cycle": "error",
      "house/direction": ["error", directionZones],
      "no-restricted-syntax": ["error", noServerActions],
      "max-lines": ["error", { max: 300, skipBlankLines: true, skipComments: true }],
      eqeqeq: ["error", "always", { null: "ignore" }],
    },
  },
  {
    files: ["app/**/*.{ts,tsx}", "lib/**/*.{ts,tsx}", "db/**/*.{ts,tsx}"],
    ignores: ["lib/config/env.ts"],
    rules: { "no-restricted-syntax": ["error", noServerActions, noProcessEnv] },
  },
  {
    files: ["app/**/*.{ts,tsx}", "lib/services/**/*.ts", "lib/http/**/*.ts"],
    rules: { "no-restricted-syntax": ["error", noServerActions, noProcessEnv, noRoleNames] },
  },
  {
    files: ["app/**/*.tsx"],
    ignores: ["app/_components/ui/link.tsx"],
    rules: {
      "no-restricted-imports": [
        "error",
        { paths: [{ name: "next/link", message: "Use ui/link: no page is fetched ahead." }] },
      ],
    },
  },
  {
    files: ["lib/services/**/*.ts"],
    rules: { "house/guarded-transaction": "error", "house/where-on-write": "error" },
  },
  {
    files: ["lib/**/*.ts", "db/**/*.ts"],
    rules: { "max-lines-per-function": ["error", { max: 60, skipBlankLines: true, skipComments: true }] },
  },
  {
    files: ["app/**/*.tsx"],
    rules: { "max-lines-per-function": ["error", { max: 100, skipBlankLines: true, skipComments: true }] },
  },
);
