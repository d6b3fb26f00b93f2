import { METAL_RULES } from './metalRules';
import { PAINT_RULES } from './paintRules';
import { PREPARATION_RULES } from './preparationRules';
import type { CompatibilityRule } from './rule';
import type { CompatibilityCode } from './warnings';

/** Every rule by the code of its warning. */
export const COMPATIBILITY_RULES: Readonly<Record<CompatibilityCode, CompatibilityRule>> = {
	...METAL_RULES,
	...PAINT_RULES,
	...PREPARATION_RULES
};
