/** Words of the printed register: id under `registerPrint.pdf`, params, and the number that chooses between one and several. */
export type Say = (id: string, params?: Record<string, string | number>, plural?: number) => string
