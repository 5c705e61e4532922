import * as z from 'zod';

/**
 * How a shop meets sales tax on what it builds and installs.
 *
 * `on-price`: the taxable lines of the price are taxed and the customer pays it. `shop-pays-use-tax`: the shop is the
 * consumer of its materials, pays tax when buying them and bills none. Which one holds is state law and the shop's
 * adviser has the last word.
 */
export const SHOP_TAX_RULES = ['on-price', 'shop-pays-use-tax'] as const;
export const shopTaxRuleSchema = z.enum(SHOP_TAX_RULES, { error: 'Choose a tax rule.' });
export type ShopTaxRule = z.infer<typeof shopTaxRuleSchema>;

/** An estimate follows the shop's rule, or none at all for a customer with an exemption certificate on file. */
export const TAX_RULES = [...SHOP_TAX_RULES, 'exempt'] as const;
export const taxRuleSchema = z.enum(TAX_RULES, { error: 'Choose a tax rule.' });
export type TaxRule = z.infer<typeof taxRuleSchema>;
