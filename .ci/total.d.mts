export function totalOf(input: {
  vitest: object | null;
  playwright: object | null;
  status: number;
  required: boolean;
}): {
  notes: string[];
  line: string;
  ok: boolean;
};
