export declare const apiTokenPrefix: string
export declare function newSecret(): string
export declare function newApiToken(): string
export declare function hashSecret(secret: string): string
