export function areNodePackagesCurrent(root: string): boolean;
export function ensureNodePackages(root: string): void;
