/** Why one item of a package does not come in; the rest may. */
export class ItemRefusal extends Error {}
