export function addLateral() {}
