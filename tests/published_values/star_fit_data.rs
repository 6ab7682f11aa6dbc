//! Checkpoints of the analytic fits: the formulae of Hurley, Pols & Tout 2000, MNRAS 315, 543 and Tout, Pols, Eggleton &
//! Han 1996, MNRAS 281, 257, evaluated outside this project in two independent programs that agree.

/// Fixed points of one mass at one composition. Times are in Myr, the rest in solar units.
pub(crate) struct Fixed {
    pub heavy_elements: f64,
    /// Zero where the values are those of the composition alone.
    pub mass_msun: f64,
    pub values: &'static [(&'static str, f64)],
}

#[rustfmt::skip]
pub(crate) const FIXED: &[Fixed] = &[
    Fixed { heavy_elements: 0.02, mass_msun: 0.3, values: &[
        ("L_ZAMS", 0.0130268), ("R_ZAMS", 0.30196), ("t_MS", 403716.0), ("t_hook", 212482.0), ("L_TMS", 0.036303),
        ("R_TMS", 0.467526), ("L_at_0.25_tMS", 0.0142167), ("R_at_0.25_tMS", 0.317494), ("L_at_0.5_tMS", 0.0156476),
        ("R_at_0.5_tMS", 0.337172), ("L_at_0.75_tMS", 0.0179615), ("R_at_0.75_tMS", 0.367936), ("t_BGB", 424964.0),
        ("L_BGB", 0.0367322), ("R_giant_at_L_BGB", 0.407999), ("t_HeI", 450186.0), ("L_HeI", 2881.17),
        ("R_giant_at_L_HeI", 244.443), ("Mc_HeI", 0.480391), ("L_at_5_Gyr", 0.0130809), ("R_at_5_Gyr", 0.302686),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.5, values: &[
        ("L_ZAMS", 0.0378742), ("R_ZAMS", 0.458758), ("t_MS", 128762.0), ("t_hook", 67769.4), ("L_TMS", 0.194119),
        ("R_TMS", 0.744021), ("L_at_0.25_tMS", 0.043381), ("R_at_0.25_tMS", 0.4827), ("L_at_0.5_tMS", 0.0551904),
        ("R_at_0.5_tMS", 0.515159), ("L_at_0.75_tMS", 0.0799448), ("R_at_0.75_tMS", 0.569759), ("t_BGB", 135539.0),
        ("L_BGB", 0.341145), ("R_giant_at_L_BGB", 0.978264), ("t_HeI", 139474.0), ("L_HeI", 2825.48),
        ("R_giant_at_L_HeI", 211.524), ("Mc_HeI", 0.478831), ("t_He", 161.865), ("L_BAGB", 129.029),
        ("Mc_BAGB", 0.511437), ("L_at_5_Gyr", 0.0384168), ("R_at_5_Gyr", 0.462233),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.8, values: &[
        ("L_ZAMS", 0.236307), ("R_ZAMS", 0.729209), ("t_MS", 26518.3), ("t_hook", 13957.0), ("L_TMS", 0.959426),
        ("R_TMS", 1.25085), ("L_at_0.25_tMS", 0.28706), ("R_at_0.25_tMS", 0.759237), ("L_at_0.5_tMS", 0.372868),
        ("R_at_0.5_tMS", 0.807642), ("L_at_0.75_tMS", 0.52406), ("R_at_0.75_tMS", 0.903312), ("t_BGB", 27914.0),
        ("L_BGB", 1.57029), ("R_giant_at_L_BGB", 1.829), ("t_HeI", 29015.1), ("L_HeI", 2775.19),
        ("R_giant_at_L_HeI", 185.167), ("Mc_HeI", 0.4774), ("t_He", 132.021), ("L_BAGB", 150.938),
        ("Mc_BAGB", 0.511669),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 1.0, values: &[
        ("L_ZAMS", 0.697717), ("R_ZAMS", 0.888249), ("t_MS", 11003.1), ("t_hook", 9323.92), ("L_TMS", 2.1197),
        ("R_TMS", 1.62398), ("L_at_0.25_tMS", 0.826251), ("R_at_0.25_tMS", 0.938484), ("L_at_0.5_tMS", 1.04097),
        ("R_at_0.5_tMS", 1.01574), ("L_at_0.75_tMS", 1.40002), ("R_at_0.75_tMS", 1.162), ("t_BGB", 11582.2),
        ("L_BGB", 2.51543), ("R_giant_at_L_BGB", 2.20148), ("t_HeI", 12325.1), ("L_HeI", 2751.62),
        ("R_giant_at_L_HeI", 173.83), ("Mc_HeI", 0.476722), ("t_He", 131.514), ("L_BAGB", 162.606),
        ("Mc_BAGB", 0.512228), ("L_at_0_Gyr", 0.697717), ("R_at_0_Gyr", 0.888249), ("L_at_1_Gyr", 0.736659),
        ("R_at_1_Gyr", 0.905052), ("L_at_2_Gyr", 0.784159), ("R_at_2_Gyr", 0.923233), ("L_at_3_Gyr", 0.841574),
        ("R_at_3_Gyr", 0.943951), ("L_at_4_Gyr", 0.91061), ("R_at_4_Gyr", 0.968477), ("L_at_4.57_Gyr", 0.955962),
        ("R_at_4.57_Gyr", 0.984707), ("L_at_5_Gyr", 0.993416), ("R_at_5_Gyr", 0.998266), ("L_at_6_Gyr", 1.09276),
        ("R_at_6_Gyr", 1.03514), ("L_at_7_Gyr", 1.21242), ("R_at_7_Gyr", 1.0818), ("L_at_8_Gyr", 1.35811),
        ("R_at_8_Gyr", 1.14316), ("L_at_9_Gyr", 1.5399), ("R_at_9_Gyr", 1.22972), ("L_at_10_Gyr", 1.77812),
        ("R_at_10_Gyr", 1.3662), ("L_at_11_Gyr", 2.11839), ("R_at_11_Gyr", 1.62279),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 1.5, values: &[
        ("L_ZAMS", 4.62802), ("R_ZAMS", 1.43716), ("t_MS", 2729.25), ("t_hook", 2729.25), ("L_TMS", 10.5414),
        ("R_TMS", 2.67517), ("L_at_0.25_tMS", 5.34898), ("R_at_0.25_tMS", 1.56917), ("L_at_0.5_tMS", 6.04875),
        ("R_at_0.5_tMS", 1.76186), ("L_at_0.75_tMS", 6.69237), ("R_at_0.75_tMS", 2.08399), ("t_BGB", 2804.11),
        ("L_BGB", 6.9858), ("R_giant_at_L_BGB", 3.43333), ("t_HeI", 2962.41), ("L_HeI", 2693.23),
        ("R_giant_at_L_HeI", 154.326), ("Mc_HeI", 0.47502), ("t_He", 131.593), ("L_BAGB", 186.122),
        ("Mc_BAGB", 0.518045),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 3.0, values: &[
        ("L_ZAMS", 79.983), ("R_ZAMS", 1.97913), ("t_MS", 377.537), ("t_hook", 377.537), ("L_TMS", 206.407),
        ("R_TMS", 4.60642), ("L_at_0.25_tMS", 90.1452), ("R_at_0.25_tMS", 2.25259), ("L_at_0.5_tMS", 104.763),
        ("R_at_0.5_tMS", 2.65768), ("L_at_0.75_tMS", 125.542), ("R_at_0.75_tMS", 3.40217), ("t_BGB", 379.787),
        ("L_BGB", 109.508), ("R_giant_at_L_BGB", 14.6682), ("t_HeI", 382.21), ("L_HeI", 630.559),
        ("R_giant_at_L_HeI", 46.6253), ("Mc_HeI", 0.450569), ("t_He", 91.15), ("L_BAGB", 346.294),
        ("Mc_BAGB", 0.671136),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 5.0, values: &[
        ("L_ZAMS", 530.13), ("R_ZAMS", 2.63559), ("t_MS", 104.016), ("t_hook", 104.016), ("L_TMS", 1508.86),
        ("R_TMS", 6.14133), ("L_at_0.25_tMS", 601.787), ("R_at_0.25_tMS", 2.98829), ("L_at_0.5_tMS", 718.78),
        ("R_at_0.5_tMS", 3.49861), ("L_at_0.75_tMS", 903.321), ("R_at_0.75_tMS", 4.4238), ("t_BGB", 104.444),
        ("L_BGB", 860.661), ("R_giant_at_L_BGB", 46.9723), ("t_HeI", 104.691), ("L_HeI", 3130.83),
        ("R_giant_at_L_HeI", 115.839), ("Mc_HeI", 0.863594), ("t_He", 15.4291), ("L_BAGB", 2076.18),
        ("Mc_BAGB", 1.18921),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 8.0, values: &[
        ("L_ZAMS", 2682.73), ("R_ZAMS", 3.45674), ("t_MS", 37.1499), ("t_hook", 37.1499), ("L_TMS", 8297.34),
        ("R_TMS", 8.13393), ("L_at_0.25_tMS", 3081.53), ("R_at_0.25_tMS", 3.92341), ("L_at_0.5_tMS", 3771.35),
        ("R_at_0.5_tMS", 4.58884), ("L_at_0.75_tMS", 4917.8), ("R_at_0.75_tMS", 5.78241), ("t_BGB", 37.2605),
        ("L_BGB", 4643.52), ("R_giant_at_L_BGB", 126.95), ("t_HeI", 37.2882), ("L_HeI", 13405.7),
        ("R_giant_at_L_HeI", 272.602), ("Mc_HeI", 1.6249), ("t_He", 4.40273), ("L_BAGB", 11808.8),
        ("Mc_BAGB", 2.17776),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 25.0, values: &[
        ("L_ZAMS", 76361.7), ("R_ZAMS", 6.89608), ("t_MS", 6.83711), ("t_hook", 6.83711), ("L_TMS", 207183.0),
        ("R_TMS", 19.9739), ("L_at_0.25_tMS", 89363.7), ("R_at_0.25_tMS", 7.95802), ("L_at_0.5_tMS", 109207.0),
        ("R_at_0.5_tMS", 9.53769), ("L_at_0.75_tMS", 139361.0), ("R_at_0.75_tMS", 12.5897), ("t_BGB", 6.84736),
        ("L_BGB", 135590.0), ("t_HeI", 6.84736), ("L_HeI", 212405.0), ("R_HeI", 894.975), ("t_He", 0.74125),
        ("L_BAGB", 267110.0), ("Mc_BAGB", 9.61674),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.1, values: &[
        ("L_ZAMS", 0.000958247), ("R_ZAMS", 0.130456), ("t_MS", 3656070.0), ("L_at_5_Gyr", 0.000958682),
        ("R_at_5_Gyr", 0.134597),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.15, values: &[
        ("L_ZAMS", 0.00288313), ("R_ZAMS", 0.186919), ("t_MS", 1625160.0), ("L_at_5_Gyr", 0.00288608),
        ("R_at_5_Gyr", 0.187031),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.2, values: &[
        ("L_ZAMS", 0.00566141), ("R_ZAMS", 0.230261), ("t_MS", 914012.0), ("L_at_5_Gyr", 0.00567168),
        ("R_at_5_Gyr", 0.230506),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.25, values: &[
        ("L_ZAMS", 0.00909576), ("R_ZAMS", 0.267319), ("t_MS", 584107.0), ("L_at_5_Gyr", 0.00912166),
        ("R_at_5_Gyr", 0.267763),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.35, values: &[
        ("L_ZAMS", 0.0174489), ("R_ZAMS", 0.336779), ("t_MS", 293372.0), ("L_at_5_Gyr", 0.01755), ("R_at_5_Gyr", 0.337895),
    ] },
    Fixed { heavy_elements: 0.02, mass_msun: 0.4, values: &[
        ("L_ZAMS", 0.0226144), ("R_ZAMS", 0.373726), ("t_MS", 219924.0), ("L_at_5_Gyr", 0.022793), ("R_at_5_Gyr", 0.37538),
    ] },
    Fixed { heavy_elements: 0.0001, mass_msun: 0.0, values: &[
        ("M_hook", 1.122281), ("M_HeF", 1.880385), ("M_FGB", 4.73922),
    ] },
    Fixed { heavy_elements: 0.0001, mass_msun: 0.6, values: &[
        ("t_MS", 39946.31), ("t_hook", 20174.9), ("L_TMS", 1.672777), ("R_TMS", 1.249921),
        ("L_at_0.8_tMS", 0.4371131), ("R_at_0.8_tMS", 0.6937844), ("L_at_0.97_tMS", 1.189237),
        ("R_at_0.97_tMS", 0.9530763), ("R_at_0.995_thook", 0.584224), ("L_BGB", 3.714287), ("L_HeI", 2112.111),
        ("t_HeI", 40953.34), ("t_He", 128.1037), ("L_BAGB", 120.3229), ("Mc_BAGB", 0.5388589), ("Mc_HeI", 0.5139166),
        ("tau_bl", 1.0), ("R_HeI", 90.34125), ("Mc_BGB", 0.1785469), ("CHeB_L_0.3", 34.3831),
        ("CHeB_R_0.3", 0.7334946), ("CHeB_L_0.95", 102.679), ("CHeB_R_0.95", 10.08739), ("R_AGB_at_L_BAGB", 15.82366),
        ("t_DU", 41087.86), ("L_DU", 2806.8), ("L_TP_0.2Myr", 3047.051),
    ] },
    Fixed { heavy_elements: 0.0001, mass_msun: 1.2, values: &[
        ("t_MS", 3208.655), ("t_hook", 2735.942), ("L_TMS", 19.40317), ("R_TMS", 3.633195),
        ("L_at_0.8_tMS", 7.860369), ("R_at_0.8_tMS", 1.126196), ("L_at_0.97_tMS", 14.70413),
        ("R_at_0.97_tMS", 1.677003), ("R_at_0.995_thook", 1.150533), ("L_BGB", 21.39881), ("L_HeI", 1872.354),
        ("t_HeI", 3360.894), ("t_He", 106.7604), ("L_BAGB", 177.7159), ("Mc_BAGB", 0.5539514), ("Mc_HeI", 0.5036991),
        ("tau_bl", 1.0), ("R_HeI", 76.6655), ("Mc_BGB", 0.2390588), ("CHeB_L_0.3", 114.2101),
        ("CHeB_R_0.3", 9.774425), ("CHeB_L_0.95", 172.1599), ("CHeB_R_0.95", 17.15057), ("R_AGB_at_L_BAGB", 18.88949),
        ("t_DU", 3472.216), ("L_DU", 3312.766), ("L_TP_0.2Myr", 3642.132),
    ] },
    Fixed { heavy_elements: 0.0001, mass_msun: 2.2, values: &[
        ("t_MS", 576.1948), ("t_hook", 575.1582), ("L_TMS", 121.8695), ("R_TMS", 1.79716), ("L_at_0.8_tMS", 79.04006),
        ("R_at_0.8_tMS", 1.488695), ("L_at_0.97_tMS", 99.79629), ("R_at_0.97_tMS", 1.950385),
        ("R_at_0.995_thook", 2.02034), ("L_BGB", 125.8952), ("L_HeI", 232.0535), ("t_HeI", 584.0002),
        ("t_He", 95.63351), ("L_BAGB", 337.8372), ("Mc_BAGB", 0.7006033), ("Mc_HeI", 0.3594507),
        ("tau_bl", 0.9196935), ("R_HeI", 20.5595), ("Mc_BGB", 0.3261118), ("CHeB_L_0.3", 216.5008),
        ("CHeB_R_0.3", 7.807776), ("CHeB_L_0.95", 329.9449), ("CHeB_R_0.95", 18.15796), ("R_AGB_at_L_BAGB", 25.58658),
        ("t_DU", 682.7595), ("L_DU", 8213.665), ("L_TP_0.2Myr", 9787.352),
    ] },
    Fixed { heavy_elements: 0.0001, mass_msun: 15.0, values: &[
        ("t_MS", 14.06057), ("t_hook", 14.06057), ("L_TMS", 58754.57), ("R_TMS", 7.416246),
        ("L_at_0.8_tMS", 39153.41), ("R_at_0.8_tMS", 5.524704), ("L_at_0.97_tMS", 49270.81),
        ("R_at_0.97_tMS", 8.075339), ("R_at_0.995_thook", 8.616626), ("L_BGB", 205645.7), ("L_HeI", 76008.23),
        ("t_HeI", 14.09497), ("t_He", 1.367861), ("L_BAGB", 89399.38), ("Mc_BAGB", 5.440075), ("Mc_HeI", 3.796961),
        ("tau_bl", 1.0), ("R_HeI", 18.43916), ("CHeB_L_0.3", 79799.98), ("CHeB_R_0.3", 20.176),
        ("CHeB_L_0.95", 88676.96), ("CHeB_R_0.95", 321.4792), ("R_AGB_at_L_BAGB", 517.205),
    ] },
    Fixed { heavy_elements: 0.001, mass_msun: 0.0, values: &[
        ("M_hook", 0.961127), ("M_HeF", 1.817006), ("M_FGB", 10.34398),
    ] },
    Fixed { heavy_elements: 0.001, mass_msun: 0.6, values: &[
        ("t_MS", 41725.67), ("t_hook", 21288.61), ("L_TMS", 1.274394), ("R_TMS", 1.185203),
        ("L_at_0.8_tMS", 0.4044192), ("R_at_0.8_tMS", 0.7099436), ("L_at_0.97_tMS", 0.9616399),
        ("R_at_0.97_tMS", 0.9527579), ("R_at_0.995_thook", 0.5989159), ("L_BGB", 2.163799), ("L_HeI", 2426.848),
        ("t_HeI", 43478.18), ("t_He", 119.5689), ("L_BAGB", 131.2379), ("Mc_BAGB", 0.5270836), ("Mc_HeI", 0.4993982),
        ("tau_bl", 1.0), ("R_HeI", 111.4528), ("Mc_BGB", 0.1549326), ("CHeB_L_0.3", 41.40523),
        ("CHeB_R_0.3", 1.86746), ("CHeB_L_0.95", 113.406), ("CHeB_R_0.95", 12.55577), ("R_AGB_at_L_BAGB", 17.41769),
        ("t_DU", 43603.45), ("L_DU", 3354.577), ("L_TP_0.2Myr", 3711.604),
    ] },
    Fixed { heavy_elements: 0.001, mass_msun: 1.2, values: &[
        ("t_MS", 3384.318), ("t_hook", 3214.892), ("L_TMS", 12.8231), ("R_TMS", 3.240217), ("L_at_0.8_tMS", 6.69172),
        ("R_at_0.8_tMS", 1.310202), ("L_at_0.97_tMS", 11.48963), ("R_at_0.97_tMS", 1.901173),
        ("R_at_0.995_thook", 1.675449), ("L_BGB", 12.23786), ("L_HeI", 2240.037), ("t_HeI", 3636.698),
        ("t_He", 107.5318), ("L_BAGB", 184.228), ("Mc_BAGB", 0.5397845), ("Mc_HeI", 0.4927754), ("tau_bl", 1.0),
        ("R_HeI", 94.53823), ("Mc_BGB", 0.2068033), ("CHeB_L_0.3", 100.5149), ("CHeB_R_0.3", 12.53996),
        ("CHeB_L_0.95", 175.9213), ("CHeB_R_0.95", 18.40031), ("R_AGB_at_L_BAGB", 19.65297), ("t_DU", 3748.471),
        ("L_DU", 3869.754), ("L_TP_0.2Myr", 4339.441),
    ] },
    Fixed { heavy_elements: 0.001, mass_msun: 2.2, values: &[
        ("t_MS", 615.6326), ("t_hook", 615.6326), ("L_TMS", 106.2479), ("R_TMS", 2.355931),
        ("L_at_0.8_tMS", 69.01355), ("R_at_0.8_tMS", 1.89284), ("L_at_0.97_tMS", 84.95114),
        ("R_at_0.97_tMS", 2.651267), ("R_at_0.995_thook", 2.800076), ("L_BGB", 94.41846), ("L_HeI", 340.9026),
        ("t_HeI", 625.7171), ("t_He", 115.9815), ("L_BAGB", 323.6102), ("Mc_BAGB", 0.6752308), ("Mc_HeI", 0.3694809),
        ("tau_bl", 0.8637259), ("R_HeI", 26.20433), ("Mc_BGB", 0.3053435), ("CHeB_L_0.3", 140.1218),
        ("CHeB_R_0.3", 13.85696), ("CHeB_L_0.95", 304.7817), ("CHeB_R_0.95", 22.98398), ("R_AGB_at_L_BAGB", 25.39969),
        ("t_DU", 744.8188), ("L_DU", 8740.773), ("L_TP_0.2Myr", 10604.94),
    ] },
    Fixed { heavy_elements: 0.001, mass_msun: 15.0, values: &[
        ("t_MS", 14.24216), ("t_hook", 14.24216), ("L_TMS", 58521.28), ("R_TMS", 8.82844), ("L_at_0.8_tMS", 38527.95),
        ("R_at_0.8_tMS", 6.45992), ("L_at_0.97_tMS", 48999.61), ("R_at_0.97_tMS", 9.733829),
        ("R_at_0.995_thook", 10.48855), ("L_BGB", 67212.27), ("L_HeI", 74650.57), ("t_HeI", 14.27326),
        ("t_He", 1.416982), ("L_BAGB", 96260.61), ("Mc_BAGB", 5.481116), ("Mc_HeI", 3.79697), ("tau_bl", 1.0),
        ("R_HeI", 32.35546), ("CHeB_L_0.3", 80567.11), ("CHeB_R_0.3", 34.91904), ("CHeB_L_0.95", 95044.68),
        ("CHeB_R_0.95", 364.3293), ("R_AGB_at_L_BAGB", 545.029),
    ] },
    Fixed { heavy_elements: 0.01, mass_msun: 0.0, values: &[
        ("M_hook", 0.9783733), ("M_HeF", 1.927626), ("M_FGB", 12.48036),
    ] },
    Fixed { heavy_elements: 0.01, mass_msun: 0.6, values: &[
        ("t_MS", 64565.18), ("t_hook", 33981.67), ("L_TMS", 0.5088742), ("R_TMS", 1.043873),
        ("L_at_0.8_tMS", 0.2067817), ("R_at_0.8_tMS", 0.6955626), ("L_at_0.97_tMS", 0.4081128),
        ("R_at_0.97_tMS", 0.8749997), ("R_at_0.995_thook", 0.6183132), ("L_BGB", 0.9534118), ("L_HeI", 2721.137),
        ("t_HeI", 69659.62), ("t_He", 133.592), ("L_BAGB", 136.7004), ("Mc_BAGB", 0.5150135), ("Mc_HeI", 0.4833165),
        ("tau_bl", 1.0), ("R_HeI", 174.6686), ("Mc_BGB", 0.1283276), ("CHeB_L_0.3", 43.7312),
        ("CHeB_R_0.3", 6.028542), ("CHeB_L_0.95", 121.1909), ("CHeB_R_0.95", 17.66099), ("R_AGB_at_L_BAGB", 21.24188),
        ("t_DU", 69798.48), ("L_DU", 3983.57), ("L_TP_0.2Myr", 4357.874),
    ] },
    Fixed { heavy_elements: 0.01, mass_msun: 1.2, values: &[
        ("t_MS", 4742.233), ("t_hook", 4613.184), ("L_TMS", 5.604195), ("R_TMS", 2.181671),
        ("L_at_0.8_tMS", 3.756381), ("R_at_0.8_tMS", 1.610893), ("L_at_0.97_tMS", 4.786801),
        ("R_at_0.97_tMS", 1.955158), ("R_at_0.995_thook", 1.90343), ("L_BGB", 4.833331), ("L_HeI", 2617.335),
        ("t_HeI", 5372.278), ("t_He", 125.4412), ("L_BAGB", 177.3692), ("Mc_BAGB", 0.5183259), ("Mc_HeI", 0.4801936),
        ("tau_bl", 1.0), ("R_HeI", 144.8191), ("Mc_BGB", 0.1681955), ("CHeB_L_0.3", 77.06834),
        ("CHeB_R_0.3", 12.09288), ("CHeB_L_0.95", 164.6994), ("CHeB_R_0.95", 20.83421), ("R_AGB_at_L_BAGB", 22.87467),
        ("t_DU", 5501.906), ("L_DU", 4139.793), ("L_TP_0.2Myr", 4447.802),
    ] },
    Fixed { heavy_elements: 0.01, mass_msun: 2.2, values: &[
        ("t_MS", 795.3345), ("t_hook", 795.3345), ("L_TMS", 68.39756), ("R_TMS", 3.455462),
        ("L_at_0.8_tMS", 44.63926), ("R_at_0.8_tMS", 2.727554), ("L_at_0.97_tMS", 50.70173),
        ("R_at_0.97_tMS", 3.886022), ("R_at_0.995_thook", 4.095715), ("L_BGB", 38.88491), ("L_HeI", 325.0026),
        ("t_HeI", 811.3328), ("t_He", 214.2702), ("L_BAGB", 178.504), ("Mc_BAGB", 0.576616), ("Mc_HeI", 0.3495415),
        ("tau_bl", 0.9238674), ("R_HeI", 30.52567), ("Mc_BGB", 0.2733401), ("CHeB_L_0.3", 62.23099),
        ("CHeB_R_0.3", 10.28334), ("CHeB_L_0.95", 158.9099), ("CHeB_R_0.95", 18.08242), ("R_AGB_at_L_BAGB", 20.06997),
        ("t_DU", 1030.325), ("L_DU", 5381.772), ("L_TP_0.2Myr", 6181.41),
    ] },
    Fixed { heavy_elements: 0.01, mass_msun: 15.0, values: &[
        ("t_MS", 13.5501), ("t_hook", 13.5501), ("L_TMS", 56706.43), ("R_TMS", 11.24108), ("L_at_0.8_tMS", 37571.62),
        ("R_at_0.8_tMS", 8.297075), ("L_at_0.97_tMS", 47283.7), ("R_at_0.97_tMS", 12.62908),
        ("R_at_0.995_thook", 13.61986), ("L_BGB", 37951.86), ("L_HeI", 71507.37), ("t_HeI", 13.5775),
        ("t_He", 1.431119), ("L_BAGB", 85873.66), ("Mc_BAGB", 5.057345), ("Mc_HeI", 3.796953), ("tau_bl", 0.317293),
        ("R_HeI", 54.34522), ("CHeB_L_0.3", 75544.63), ("CHeB_R_0.3", 427.331), ("CHeB_L_0.95", 85091.18),
        ("CHeB_R_0.95", 677.0812), ("R_AGB_at_L_BAGB", 681.5205),
    ] },
    Fixed { heavy_elements: 0.03, mass_msun: 0.0, values: &[
        ("M_hook", 1.049467), ("M_HeF", 2.041721), ("M_FGB", 13.35974),
    ] },
    Fixed { heavy_elements: 0.03, mass_msun: 0.6, values: &[
        ("t_MS", 81838.58), ("t_hook", 43072.94), ("L_TMS", 0.3471815), ("R_TMS", 1.00952),
        ("L_at_0.8_tMS", 0.150494), ("R_at_0.8_tMS", 0.71466), ("L_at_0.97_tMS", 0.2837001),
        ("R_at_0.97_tMS", 0.8862036), ("R_at_0.995_thook", 0.6294904), ("L_BGB", 0.5530544), ("L_HeI", 2854.617),
        ("t_HeI", 88752.5), ("t_He", 144.4202), ("L_BAGB", 137.0726), ("Mc_BAGB", 0.5094119), ("Mc_HeI", 0.4752943),
        ("tau_bl", 1.0), ("R_HeI", 225.0043), ("Mc_BGB", 0.1143315), ("CHeB_L_0.3", 39.84065),
        ("CHeB_R_0.3", 6.296512), ("CHeB_L_0.95", 118.4868), ("CHeB_R_0.95", 20.11699), ("R_AGB_at_L_BAGB", 24.55893),
        ("t_DU", 88902.07), ("L_DU", 3965.78), ("L_TP_0.2Myr", 4213.229),
    ] },
    Fixed { heavy_elements: 0.03, mass_msun: 1.2, values: &[
        ("t_MS", 6234.878), ("t_hook", 6037.009), ("L_TMS", 3.608214), ("R_TMS", 1.998307),
        ("L_at_0.8_tMS", 2.435113), ("R_at_0.8_tMS", 1.48187), ("L_at_0.97_tMS", 3.508015),
        ("R_at_0.97_tMS", 1.914286), ("R_at_0.995_thook", 1.677702), ("L_BGB", 3.203039), ("L_HeI", 2799.904),
        ("t_HeI", 7086.904), ("t_He", 135.0114), ("L_BAGB", 169.622), ("Mc_BAGB", 0.5110033), ("Mc_HeI", 0.4737637),
        ("tau_bl", 1.0), ("R_HeI", 184.4037), ("Mc_BGB", 0.153214), ("CHeB_L_0.3", 63.70318), ("CHeB_R_0.3", 13.4655),
        ("CHeB_L_0.95", 151.3158), ("CHeB_R_0.95", 23.17243), ("R_AGB_at_L_BAGB", 25.43687), ("t_DU", 7226.186),
        ("L_DU", 4003.063), ("L_TP_0.2Myr", 4254.482),
    ] },
    Fixed { heavy_elements: 0.03, mass_msun: 2.2, values: &[
        ("t_MS", 947.7972), ("t_hook", 947.7972), ("L_TMS", 50.94584), ("R_TMS", 4.033769),
        ("L_at_0.8_tMS", 32.26306), ("R_at_0.8_tMS", 3.301343), ("L_at_0.97_tMS", 35.12922),
        ("R_at_0.97_tMS", 4.435551), ("R_at_0.995_thook", 4.588647), ("L_BGB", 25.58564), ("L_HeI", 267.8335),
        ("t_HeI", 968.0967), ("t_He", 239.0925), ("L_BAGB", 184.6967), ("Mc_BAGB", 0.5462868), ("Mc_HeI", 0.3283126),
        ("tau_bl", 0.9519408), ("R_HeI", 30.15479), ("Mc_BGB", 0.2508137), ("CHeB_L_0.3", 46.40782),
        ("CHeB_R_0.3", 9.7156), ("CHeB_L_0.95", 154.1474), ("CHeB_R_0.95", 21.20915), ("R_AGB_at_L_BAGB", 24.40178),
        ("t_DU", 1211.503), ("L_DU", 5093.23), ("L_TP_0.2Myr", 5869.639),
    ] },
    Fixed { heavy_elements: 0.03, mass_msun: 15.0, values: &[
        ("t_MS", 11.80582), ("t_hook", 11.80582), ("L_TMS", 61424.81), ("R_TMS", 13.80136),
        ("L_at_0.8_tMS", 40154.33), ("R_at_0.8_tMS", 10.15138), ("L_at_0.97_tMS", 50407.81),
        ("R_at_0.97_tMS", 15.60513), ("R_at_0.995_thook", 16.78144), ("L_BGB", 29663.95), ("L_HeI", 68659.84),
        ("t_HeI", 11.82934), ("t_He", 1.33312), ("L_BAGB", 78713.23), ("Mc_BAGB", 4.92153), ("Mc_HeI", 3.796938),
        ("tau_bl", 0.0), ("R_HeI", 675.4449), ("CHeB_L_0.3", 74707.83), ("CHeB_R_0.3", 719.3354),
        ("CHeB_L_0.95", 78495.1), ("CHeB_R_0.95", 746.3888), ("R_AGB_at_L_BAGB", 747.9374),
    ] },
];

/// A whole life with winds at Z = 0.02: extremes of each phase, times in Myr, the rest in solar units.
pub(crate) struct Lived {
    pub mass_msun: f64,
    pub values: &'static [(&'static str, f64)],
}

#[rustfmt::skip]
pub(crate) const LIVED: &[Lived] = &[
    Lived { mass_msun: 0.5, values: &[
        ("Rmax_RGB", 55.665496), ("Lmax_RGB", 494.390222), ("t_end", 139468.095223), ("remnant_mass", 0.363099),
    ] },
    Lived { mass_msun: 0.8, values: &[
        ("Rmax_RGB", 166.074586), ("Lmax_RGB", 2484.910602), ("t_end", 29015.070537), ("remnant_mass", 0.47404),
    ] },
    Lived { mass_msun: 1.0, values: &[
        ("Rmax_RGB", 186.434309), ("Lmax_RGB", 2751.621903), ("Rmax_CHeB", 23.882897), ("Lmax_CHeB", 148.370018),
        ("Rmax_EAGB", 218.442275), ("Lmax_EAGB", 4017.172338), ("Rmax_TPAGB", 213.181321),
        ("Lmax_TPAGB", 4078.754797), ("M_at_RGBtip", 0.76084), ("t_He", 132.439555), ("t_end", 12462.590495),
        ("remnant_mass", 0.519162), ("t_TPAGB", 0.205009),
    ] },
    Lived { mass_msun: 1.5, values: &[
        ("Rmax_RGB", 155.991906), ("Lmax_RGB", 2693.232331), ("Rmax_CHeB", 24.403677), ("Lmax_CHeB", 183.457008),
        ("Rmax_EAGB", 208.315203), ("Lmax_EAGB", 4137.027238), ("Rmax_TPAGB", 305.5986), ("Lmax_TPAGB", 6244.571183),
        ("M_at_RGBtip", 1.438401), ("t_He", 131.534045), ("t_end", 3099.253126), ("remnant_mass", 0.576083),
        ("t_TPAGB", 1.296235),
    ] },
    Lived { mass_msun: 3.0, values: &[
        ("Rmax_RGB", 46.632319), ("Lmax_RGB", 630.5587), ("Rmax_CHeB", 46.632319), ("Lmax_CHeB", 630.5587),
        ("Rmax_EAGB", 230.600635), ("Lmax_EAGB", 6757.46789), ("Rmax_TPAGB", 611.300374), ("Lmax_TPAGB", 18616.28168),
        ("M_at_RGBtip", 2.998883), ("t_He", 91.15001), ("t_end", 477.684692), ("remnant_mass", 0.748147),
        ("t_TPAGB", 1.157009),
    ] },
    Lived { mass_msun: 5.0, values: &[
        ("Rmax_RGB", 115.8499), ("Lmax_RGB", 3130.833838), ("Rmax_CHeB", 115.8499), ("Lmax_CHeB", 3130.833838),
        ("Rmax_EAGB", 399.821619), ("Lmax_EAGB", 18723.700711), ("Rmax_TPAGB", 1065.45391),
        ("Lmax_TPAGB", 45836.119485), ("M_at_RGBtip", 4.998795), ("t_He", 15.429137), ("t_end", 121.570503),
        ("remnant_mass", 0.998097), ("t_TPAGB", 0.636378),
    ] },
    Lived { mass_msun: 8.0, values: &[
        ("Rmax_RGB", 270.239542), ("Lmax_RGB", 13205.447406), ("Rmax_CHeB", 270.239542), ("Lmax_CHeB", 13205.447406),
        ("Rmax_EAGB", 528.328069), ("Lmax_EAGB", 34132.036014), ("Rmax_TPAGB", 1582.560076),
        ("Lmax_TPAGB", 90872.506196), ("M_at_RGBtip", 7.955781), ("t_He", 4.454374), ("t_end", 42.500066),
        ("remnant_mass", 1.43878), ("t_TPAGB", 0.504615),
    ] },
    Lived { mass_msun: 25.0, values: &[
        ("Rmax_CHeB", 1541.811516), ("Lmax_CHeB", 231573.25851), ("t_end", 7.807052), ("remnant_mass", 1.735257),
    ] },
];
