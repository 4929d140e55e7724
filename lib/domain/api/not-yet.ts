/** A member that asks for what another issue brings; `what` begins the sentence “… is not available yet.” */
export interface NotAvailableYet { path: string; what: string }
