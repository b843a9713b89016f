type Place = { serverUrl: string; template: string; folder: string; secret: string }
export declare function makeDemoTemplate(place: Place): Promise<void>
export declare function dropDemoTemplate(place: Pick<Place, 'serverUrl' | 'template'>): Promise<void>
export declare function demoTemplate(folder: string): Promise<string>
