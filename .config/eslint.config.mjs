import js from "@eslint/js";
import globals from "globals";
import typescript from "typescript-eslint";

export default typescript.config(js.configs.recommended, typescript.configs.recommended, {
  languageOptions: { globals: { ...globals.browser, ...globals.node } },
  rules: {
    // The host's calling convention is any[][]; the metadata tool understands nothing narrower.
    "@typescript-eslint/no-explicit-any": "off",
    "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
    "no-control-regex": "off",
    eqeqeq: "error",
    "no-eval": "error",
    "no-implied-eval": "error",
  },
});
