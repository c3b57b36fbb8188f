/** Stands for every style sheet in unit tests. */
export default {} as Record<string, string>;
